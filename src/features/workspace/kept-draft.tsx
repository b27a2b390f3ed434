import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Draft } from '#src/lib/drafts.ts';
import { sayWhen } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';

/** Work that never reached the server, offered after a reload. */
export function KeptDraft({ kept, version, onTake, onDrop }: { kept: Draft<ProductDraft>; version: number; onTake: () => void; onDrop: () => void }) {
  return (
    <div className="wrap kept-draft">
      <Banner
        weight="decide"
        title="Work that was not saved is still here."
        acts={
          <>
            <Button small weight="act" onClick={onTake}>Take it up again</Button>
            <Button small onClick={onDrop}>Let it go</Button>
          </>
        }
      >
        It was kept on this computer at {sayWhen(kept.keptAt)}.
        {kept.baseVersion < version ? ' The product was saved by someone since; you will see both versions and choose.' : ''}
      </Banner>
    </div>
  );
}
