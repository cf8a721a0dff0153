import { useState } from 'react';
import { Button } from '../ui/button.tsx';
import { Form } from '../ui/form.tsx';
import { TextField } from '../ui/text-field.tsx';

const siteCode = /^[A-Z0-9][A-Z0-9-]{0,19}$/;
const calendarMonth = /^20\d{2}-(0[1-9]|1[0-2])$/;

export interface StartFormProps {
  readonly onStart: (site: string, month: string) => void;
}

/** Offline nobody else says for which site and month something is prepared. */
export function StartForm({ onStart }: StartFormProps) {
  const [site, setSite] = useState('');
  const [month, setMonth] = useState('');
  const [attempt, setAttempt] = useState(0);
  const code = site.trim().toUpperCase();
  const missing = [
    ...(siteCode.test(code) ? [] : [{ fieldId: 'start-site', message: 'Give the code of your site as the registry writes it.' }]),
    ...(calendarMonth.test(month.trim()) ? [] : [{ fieldId: 'start-month', message: 'Write the month as 2026-11.' }]),
  ];
  const problems = attempt === 0 ? [] : missing;
  const errorAt = (id: string) => problems.find(({ fieldId }) => fieldId === id)?.message;

  return (
    <Form
      onSubmit={() => (missing.length === 0 ? onStart(code, month.trim()) : setAttempt(attempt + 1))}
      problems={problems}
      attempt={attempt}
    >
      <TextField
        id="start-site"
        label="Code of your site"
        hint="As it stands on the registry’s pages. The key file is bound to it."
        autoComplete="off"
        value={site}
        onChange={setSite}
        error={errorAt('start-site')}
        isRequired
      />
      <TextField
        id="start-month"
        label="Month"
        hint="Year and month: 2026-11"
        autoComplete="off"
        value={month}
        onChange={setMonth}
        error={errorAt('start-month')}
        isRequired
      />
      <div>
        <Button type="submit" variant="primary">
          Begin
        </Button>
      </div>
    </Form>
  );
}
