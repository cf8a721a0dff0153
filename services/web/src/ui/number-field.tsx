import type { Ref } from 'react';
import { Input } from 'react-aria-components/Input';
import { NumberField as AriaNumberField } from 'react-aria-components/NumberField';
import { FieldParts, inputLook } from './field.tsx';
import type { FieldProps } from './field.tsx';

export interface NumberFieldProps extends FieldProps {
  readonly name?: string;
  readonly value: number | null;
  readonly onChange: (value: number | null) => void;
  readonly onBlur?: () => void;
  readonly minValue?: number;
  readonly maxValue?: number;
  readonly step?: number;
  /** Written behind the label. */
  readonly unit?: string;
  readonly ref?: Ref<HTMLInputElement>;
}

/** A number, with arrow keys to step it; `null` is an empty field. */
export function NumberField({ label, hint, error, value, onChange, unit, ref, ...rest }: NumberFieldProps) {
  return (
    <AriaNumberField
      {...rest}
      value={value ?? Number.NaN}
      onChange={(next) => onChange(Number.isNaN(next) ? null : next)}
      isInvalid={error !== undefined}
      validationBehavior="aria"
      className="grid max-w-xl gap-1"
    >
      <FieldParts label={unit === undefined ? label : `${label}, ${unit}`} hint={hint} error={error} isRequired={rest.isRequired ?? false}>
        <Input {...(ref !== undefined && { ref })} className={`${inputLook} numbers max-w-40`} />
      </FieldParts>
    </AriaNumberField>
  );
}
