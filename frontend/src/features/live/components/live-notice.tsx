import type { Live } from '../use-live-project.js';
import '../live.css';

/** That the page no longer hears of changes, above it; what somebody else just did, in its corner. Always there, so that both are read out. */
export function LiveNotice({ live, said }: Live) {
  return (
    <>
      <div role="status">
        {!live && <p className="mt-live-line mt-attention">Not live: figures may be older than a minute. They are read again when the server answers.</p>}
      </div>
      <div role="status" className="mt-live-said">{live && said && <p>{said}, a moment ago</p>}</div>
    </>
  );
}
