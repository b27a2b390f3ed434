import type { ReactNode } from 'react';
import { Icon } from './icon.tsx';
import type { IconName } from './icon.tsx';

/** A small fact in a hairline frame. */
export function Tag({ icon, children }: { icon?: IconName; children: ReactNode }) {
  return (
    <span className="tag">
      {icon ? <Icon name={icon} /> : null}
      {children}
    </span>
  );
}
