import { LoadingState } from '../../../ui/states.js';

export default function Page() {
  return <LoadingState />;
}
