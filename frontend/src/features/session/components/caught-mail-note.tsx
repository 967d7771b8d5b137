import { Link } from 'react-router-dom';

/** Where a local fake catches the mail, it is read here instead of in a mailbox. */
export function CaughtMailNote() {
  return <p className="mt-sub">Mail does not leave this demonstration or development server. <Link to="/caught-mail">Read it here</Link></p>;
}
