import type { HTMLInputTypeAttribute, Ref } from 'react';
import { Input } from 'react-aria-components/Input';
import { TextArea as AriaTextArea } from 'react-aria-components/TextArea';
import { TextField as AriaTextField } from 'react-aria-components/TextField';
import { FieldParts, inputLook } from './field.tsx';
import type { FieldProps } from './field.tsx';

interface TextProps extends FieldProps {
  readonly name?: string;
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly onBlur?: () => void;
  readonly maxLength?: number;
}

export interface TextFieldProps extends TextProps {
  readonly type?: HTMLInputTypeAttribute;
  readonly inputMode?: 'text' | 'email' | 'numeric' | 'decimal' | 'url';
  readonly autoComplete?: string;
  readonly spellCheck?: 'true' | 'false';
  readonly ref?: Ref<HTMLInputElement>;
}

/** One line of text. Dates are typed here as ISO. */
export function TextField({ label, hint, error, ref, ...rest }: TextFieldProps) {
  return (
    <AriaTextField {...rest} isInvalid={error !== undefined} validationBehavior="aria" className="grid max-w-xl gap-1">
      <FieldParts label={label} hint={hint} error={error} isRequired={rest.isRequired ?? false}>
        <Input {...(ref !== undefined && { ref })} className={inputLook} />
      </FieldParts>
    </AriaTextField>
  );
}

export interface TextAreaProps extends TextProps {
  readonly rows?: number;
  readonly ref?: Ref<HTMLTextAreaElement>;
}

/** Several lines. With a `maxLength` the room left is told under the field. */
export function TextArea({ label, hint, error, rows = 4, ref, ...rest }: TextAreaProps) {
  return (
    <AriaTextField {...rest} isInvalid={error !== undefined} validationBehavior="aria" className="grid max-w-xl gap-1">
      <FieldParts label={label} hint={hint} error={error} isRequired={rest.isRequired ?? false}>
        <AriaTextArea {...(ref !== undefined && { ref })} rows={rows} className={inputLook} />
        {rest.maxLength !== undefined && (
          <span className="numbers text-small text-quiet">
            {rest.value.length} of {rest.maxLength} characters
          </span>
        )}
      </FieldParts>
    </AriaTextField>
  );
}
