/** Things to press. Primary: the one act a page is for. Danger: cannot be taken back. Quiet: beside other things. */
import { useEffect } from 'react';
import type { ReactNode, Ref } from 'react';
import { Button as AriaButton } from 'react-aria-components/Button';
import type { ButtonProps as AriaButtonProps } from 'react-aria-components/Button';
import { Link } from 'react-router-dom';
import type { LinkProps } from 'react-router-dom';
import { announce } from './announcer.tsx';

export type ButtonVariant = 'primary' | 'secondary' | 'quiet' | 'danger';

const shape = 'inline-flex min-h-10 items-center justify-center gap-2 rounded-sm border py-1.5 text-center font-semibold transition-colors';
const variants: Record<ButtonVariant, string> = {
  primary: 'border-lichen bg-lichen px-4 text-sheet hover:border-ink hover:bg-ink',
  secondary: 'border-edge bg-transparent px-4 text-ink hover:border-ink hover:bg-paper',
  danger: 'border-oxide bg-transparent px-4 text-oxide hover:bg-oxide hover:text-sheet',
  quiet: 'border-transparent bg-transparent text-lake underline decoration-1 underline-offset-3 hover:decoration-2',
};
const resting = 'disabled:border-hairline disabled:bg-transparent disabled:text-quiet data-[pending]:cursor-progress';

export interface ButtonProps extends Omit<AriaButtonProps, 'className' | 'style' | 'children' | 'isPending'> {
  readonly variant?: ButtonVariant;
  /** What it began is under way. */
  readonly isPending?: boolean;
  readonly children: ReactNode;
  readonly ref?: Ref<HTMLButtonElement>;
}

/**
 * While `isPending` the button keeps its focus and words, takes no further press, and says so to assistive technology. React Aria's
 * own pending state speaks by a reference to the button, which is broken as soon as the act leads to another page.
 */
export function Button({ variant = 'secondary', isPending = false, type, onPress, children, ...rest }: ButtonProps) {
  useEffect(() => {
    if (isPending) announce('Under way.');
  }, [isPending]);
  return (
    <AriaButton
      {...rest}
      {...(type !== undefined && { type: isPending ? 'button' : type })}
      {...(onPress !== undefined && !isPending && { onPress })}
      {...(isPending && { 'aria-disabled': true, 'data-pending': true })}
      className={`${shape} ${variants[variant]} ${resting}`}
    >
      {children}
      {isPending && <span aria-hidden="true">…</span>}
    </AriaButton>
  );
}

export interface LinkButtonProps extends Omit<LinkProps, 'className' | 'style'> {
  readonly variant?: ButtonVariant;
}

/** Looks like a button, is a link: it leads to another page of the client. */
export function LinkButton({ variant = 'secondary', ...rest }: LinkButtonProps) {
  return <Link {...rest} className={`${shape} ${variants[variant]}`} />;
}

export interface AddressButtonProps {
  readonly href: string;
  /** The name to save it under: it is a file. */
  readonly download?: string;
  readonly variant?: ButtonVariant;
  readonly children: ReactNode;
}

/** Leaves the client: a file, or the sign-in service. */
export function AddressButton({ href, download, variant = 'secondary', children }: AddressButtonProps) {
  return (
    <a href={href} download={download} className={`${shape} ${variants[variant]}`}>
      {children}
    </a>
  );
}
