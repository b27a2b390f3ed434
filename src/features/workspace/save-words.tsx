import { sayWhen } from '#src/lib/say.ts';
import type { SaveState } from './autosave.ts';

/** The state of saving, in words: `Version 7, saved 09:14`. */
export function SaveWords({ save, version, onRetry }: { save: SaveState; version: number; onRetry: () => void }) {
  return (
    <span className={`saved ${save.kind === 'not-saved' ? 'not-saved' : ''}`} role="status">
      {save.kind === 'saved' ? `Version ${version}, saved ${sayWhen(save.at)}` : null}
      {save.kind === 'waiting' ? 'Not saved yet, kept on this computer' : null}
      {save.kind === 'saving' ? 'Saving …' : null}
      {save.kind === 'conflict' ? 'Not saved: someone else saved in between' : null}
      {save.kind === 'not-saved' ? (
        <>
          Not saved: {save.why.replace(/\.$/, '')}.{' '}
          <button type="button" className="link" onClick={onRetry}>Try again</button>
        </>
      ) : null}
    </span>
  );
}
