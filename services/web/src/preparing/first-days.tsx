/** First training days that the files do not tell: typed by hand, by the place where the participant stands. */
import { useState } from 'react';
import { tableName } from '../features/submissions/table-names.ts';
import { Button } from '../ui/button.tsx';
import { TextField } from '../ui/text-field.tsx';
import type { Month } from './use-month.ts';
import type { FirstDayPlace } from './worker/protocol.ts';

export function FirstDays({ month, places }: { readonly month: Month; readonly places: readonly FirstDayPlace[] }) {
  return (
    <section aria-labelledby="first-days" className="grid max-w-2xl gap-3">
      <h3 id="first-days" className="font-semibold">
        First training days
      </h3>
      <p>
        Days are counted from the first training day. Where the files do not tell it, state it here, or leave the rows behind until training
        has begun. The day stays in the key file.
      </p>
      <ul className="grid gap-3">
        {places.map((place) => (
          <FirstDay key={`${place.table}:${place.line}`} month={month} place={place} />
        ))}
      </ul>
    </section>
  );
}

const isoDay = /^\d{4}-\d{2}-\d{2}$/;

function FirstDay({ month, place: { table, line, stated } }: { readonly month: Month; readonly place: FirstDayPlace }) {
  const [date, setDate] = useState(stated ?? '');
  const [isWrong, setWrong] = useState(false);
  const id = `first-day-${table}-${line}`;
  const isDay = isoDay.test(date) && !Number.isNaN(Date.parse(`${date}T00:00:00Z`));

  function state(): void {
    setWrong(date !== '' && !isDay);
    if (date === '' || isDay) void month.stateFirstDay({ table, line }, date === '' ? null : date);
  }

  return (
    <li className="flex flex-wrap items-end gap-3">
      <TextField
        id={id}
        label={`Participant on line ${line} of ${tableName(table)}`}
        hint="Year, month, day: 2026-03-28"
        autoComplete="off"
        value={date}
        onChange={setDate}
        error={isWrong ? 'Write the day as 2026-03-28.' : undefined}
      />
      <Button onPress={state} aria-label={`State the first training day of the participant on line ${line} of ${tableName(table)}`}>
        {stated === null ? 'State' : 'State again'}
      </Button>
    </li>
  );
}
