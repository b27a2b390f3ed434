import type { ButtonHTMLAttributes, Ref } from 'react';
import { Link } from 'react-router-dom';
import type { LinkProps } from 'react-router-dom';
import { Icon } from './icon.tsx';
import type { IconName } from './icon.tsx';

type Weight = 'plain' | 'act' | 'stop';
interface Look {
  readonly weight?: Weight;
  readonly small?: boolean;
  readonly icon?: IconName;
}
const classOf = (weight: Weight, small: boolean, more = '') => `btn ${weight === 'plain' ? '' : weight} ${small ? 'small' : ''} ${more}`;

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement>, Look {
  /** Work is under way: the button stays where it is and does nothing. */
  readonly busy?: boolean;
  readonly ref?: Ref<HTMLButtonElement>;
}

/** A button; `act` for the one thing the screen is for. */
export function Button({ weight = 'plain', small = false, icon, busy = false, className, children, onClick, ...rest }: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      aria-busy={busy || undefined}
      aria-disabled={busy || undefined}
      className={classOf(weight, small, className)}
      onClick={busy ? (event) => event.preventDefault() : onClick}
    >
      {icon ? <Icon name={icon} /> : null}
      {children}
    </button>
  );
}

/** A link that looks like a button: it goes somewhere, it changes nothing. */
export function LinkButton({ weight = 'plain', small = false, icon, className, children, ...rest }: LinkProps & Look) {
  return (
    <Link {...rest} className={classOf(weight, small, className)}>
      {icon ? <Icon name={icon} /> : null}
      {children}
    </Link>
  );
}

/** A button that reads as an underlined word. */
export function TextButton({ mini = false, className = '', ...rest }: ButtonHTMLAttributes<HTMLButtonElement> & { mini?: boolean; ref?: Ref<HTMLButtonElement> }) {
  return <button type="button" {...rest} className={`link ${mini ? 'mini' : ''} ${className}`} />;
}

/** A small button drawn as an icon, with its word for those who hear it and on hover. */
export function IconButton({ icon, word, className = '', ...rest }: ButtonHTMLAttributes<HTMLButtonElement> & { icon: IconName; word: string; ref?: Ref<HTMLButtonElement> }) {
  return (
    <button type="button" title={word} aria-label={word} {...rest} className={`icon-btn ${className}`}>
      <Icon name={icon} />
    </button>
  );
}
