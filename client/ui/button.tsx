import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router-dom';

export type ButtonLook = 'plain' | 'primary' | 'refusal' | 'quiet';

const looks: Readonly<Record<ButtonLook, string>> = {
  plain: 'button',
  primary: 'button button-primary',
  refusal: 'button button-refusal',
  quiet: 'button button-quiet',
};

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  look?: ButtonLook;
  small?: boolean;
  /** Work is going on: the button keeps its focus and its size, and does nothing until it is done. */
  busy?: boolean;
  children: ReactNode;
}

/** A verb that acts. Busy is not disabled: a disabled button would lose the focus of who pressed it. */
export function Button({ look = 'plain', small = false, busy = false, type = 'button', className = '', onClick, children, ...rest }: ButtonProps) {
  return (
    <button
      type={busy && type === 'submit' ? 'button' : type}
      className={`${looks[look]} ${small ? 'button-small' : ''} ${className}`}
      aria-disabled={busy || undefined}
      aria-busy={busy || undefined}
      data-busy={busy || undefined}
      onClick={busy ? undefined : onClick}
      {...rest}
    >
      {children}
    </button>
  );
}

interface LinkButtonProps extends LinkProps {
  look?: ButtonLook;
  small?: boolean;
}

/** A link that looks like a button: it opens a page. */
export function LinkButton({ look = 'plain', small = false, className = '', ...rest }: LinkButtonProps) {
  return <Link className={`${looks[look]} ${small ? 'button-small' : ''} ${className}`} {...rest} />;
}

/** A word in running text that acts. */
export function TextButton({ className = '', type = 'button', ...rest }: ButtonHTMLAttributes<HTMLButtonElement>) {
  return <button type={type} className={`link-button ${className}`} {...rest} />;
}
