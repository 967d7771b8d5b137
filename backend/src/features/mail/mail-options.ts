/** How mail leaves, and the address at which people reach this installation. */
export interface MailOptions {
  /** smtp://… or smtps://…; without it nothing is sent, and the administrator is told so */
  smtpUrl: string | undefined;
  from: string;
  /** links begin with it: never with what a request says about its host, which its sender chooses */
  publicUrl: string;
  /** it goes to the local fake, whose mail is read here: by everybody (a demonstration), or by whoever sits at this machine */
  caught: false | 'for-everybody' | 'for-this-machine';
  /** between attempts */
  retryDelaysMs: readonly number[];
}
export const MAIL_OPTIONS = Symbol('mail options');
export const noMail: MailOptions = { smtpUrl: undefined, from: 'Mantlet <mantlet@localhost>', publicUrl: 'http://localhost', caught: false, retryDelaysMs: [] };
