/** What every field has: a label above, a hint under it, the error beside it in the same words as the summary on top. */
import type { ReactNode } from 'react';
import { FieldError as AriaFieldError } from 'react-aria-components/FieldError';
import { Label } from 'react-aria-components/Label';
import { Text } from 'react-aria-components/Text';

export interface FieldProps {
  /** Names the input for the error summary's links; unique on the page. */
  readonly id: string;
  readonly label: string;
  readonly hint?: ReactNode;
  /** What is wrong and how to mend it. */
  readonly error?: string | undefined;
  readonly isRequired?: boolean;
  readonly isDisabled?: boolean;
}

export const inputLook =
  'min-h-10 w-full rounded-sm border border-edge bg-sheet px-3 py-1.5 text-ink placeholder:text-quiet disabled:border-hairline disabled:text-quiet data-[invalid]:border-2 data-[invalid]:border-oxide';

export function FieldLabel({ children, isRequired = false }: { readonly children: ReactNode; readonly isRequired?: boolean | undefined }) {
  return (
    <Label className="font-semibold">
      {children}
      {isRequired && <span className="font-normal text-quiet"> (required)</span>}
    </Label>
  );
}

export function FieldHint({ children }: { readonly children: ReactNode }) {
  return (
    <Text slot="description" className="block text-small text-quiet">
      {children}
    </Text>
  );
}

export function FieldError({ children }: { readonly children: ReactNode }) {
  return <AriaFieldError className="block border-l-4 border-oxide pl-2 font-semibold text-oxide">{children}</AriaFieldError>;
}

/** Label, hint, error, then the input itself: a reader meets what is wrong before the place to mend it. */
export function FieldParts({ label, hint, error, isRequired, children }: Omit<FieldProps, 'id'> & { readonly children: ReactNode }) {
  return (
    <>
      <FieldLabel isRequired={isRequired}>{label}</FieldLabel>
      {hint !== undefined && <FieldHint>{hint}</FieldHint>}
      {error !== undefined && <FieldError>{error}</FieldError>}
      {children}
    </>
  );
}
