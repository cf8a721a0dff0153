/** The clinic's files as they are: dropped, each given its table, with what was found out about how they are written. */
import { tables } from '../features/submissions/table-names.ts';
import { formatBytes, formatCount } from '../lib/format.ts';
import { Button } from '../ui/button.tsx';
import { EmptyState } from '../ui/empty-state.tsx';
import { FileDrop } from '../ui/file-drop.tsx';
import { Notice } from '../ui/notice.tsx';
import { Section } from '../ui/page.tsx';
import { Progress } from '../ui/progress.tsx';
import { RadioGroup } from '../ui/radio-group.tsx';
import { Select } from '../ui/select.tsx';
import { Arrival } from './arrival.tsx';
import { nameOf, obstacleOf } from './month-state.ts';
import type { Month } from './use-month.ts';
import type { SourcePicture } from './worker/protocol.ts';

const tableOptions = tables.map(({ key, name }) => ({ value: key, label: name }));
const delimiterWords = { ',': 'commas', ';': 'semicolons', '\t': 'tabs' } as const;
const encodingWords: Readonly<Record<string, string>> = {
  ascii: 'plain ASCII',
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16',
  'utf-16be': 'UTF-16',
  'windows-1252': 'Windows-1252',
};

export function FilesSection({ month, monthName }: { readonly month: Month; readonly monthName: string }) {
  const { picture, progress, refusal, isStale } = month.state;
  const isOpen = picture?.key != null;
  const obstacle = obstacleOf(picture?.sources ?? []);
  return (
    <Section
      title="Files"
      id="files"
      note={
        <>
          <p>CSV files or a workbook, as your clinic keeps them: with record numbers and dates. They are read in this page and not sent.</p>
          <p>File names, sheet names and document properties are never sent either.</p>
        </>
      }
    >
      {!isOpen ? (
        <EmptyState>Open the site key first. Without it nobody in the files can be given a code.</EmptyState>
      ) : (
        <>
          <Arrival label="The key is open. Next: the files of the month." />
          <div className="grid gap-6">
            <FileDrop
              label={`Files of ${monthName}`}
              hint="All tables at once, or one by one. A file of the same name takes the place of the earlier one."
              accept={['.csv', '.txt', '.tsv', '.xlsx']}
              multiple
              onFiles={(files) => void month.addFiles(files)}
            />
            {picture.refused.map(({ fileName, found, mend, line }) => (
              <Notice key={fileName} kind="error" title={`${fileName} was not read.`} urgent>
                <p>
                  {found}
                  {line !== null && ` Line ${line}.`} {mend}
                </p>
              </Notice>
            ))}
            {picture.sources.length > 0 && (
              <ul className="grid gap-4">
                {picture.sources.map((source) => (
                  <SourceItem key={source.id} source={source} month={month} />
                ))}
              </ul>
            )}
            {obstacle !== null && <Notice kind="warning" title={obstacle} />}
            {progress !== null && (
              <div className="grid max-w-xl gap-2">
                <Progress
                  label={progress.what}
                  part={progress.bytes === null ? null : progress.bytes.done / progress.bytes.of}
                  words={`${progress.what}${progress.bytes === null ? '' : `: ${formatBytes(progress.bytes.done)} of ${formatBytes(progress.bytes.of)}`}`}
                />
                <div>
                  <Button onPress={month.stop}>Stop</Button>
                </div>
              </div>
            )}
            {refusal !== null && (
              <Notice kind="error" title={refusal} urgent>
                <Button onPress={() => void month.workOut()}>Work the preview out again</Button>
              </Notice>
            )}
            {isStale && progress === null && refusal === null && <p role="status">Working out the preview.</p>}
          </div>
        </>
      )}
    </Section>
  );
}

function SourceItem({ source, month }: { readonly source: SourcePicture; readonly month: Month }) {
  const { id, fileName, sheet, table, rows, columns, encoding, delimiter, fittingDelimiters, decimalMark, hasBothMarks, notes } = source;
  const written = [
    `${formatCount(rows, 'row')}, ${formatCount(columns, 'column')}`,
    ...(encoding === null ? [] : [encodingWords[encoding] ?? encoding]),
    ...(delimiter === null ? [] : [`cells separated by ${delimiterWords[delimiter]}`]),
    `decimal ${decimalMark === '.' ? 'point' : 'comma'}`,
  ];
  return (
    <li className="grid max-w-2xl gap-3 border-l-2 border-hairline pl-4">
      <div className="flex flex-wrap items-start justify-between gap-x-6">
        <div className="min-w-0">
          <h3 className="font-semibold wrap-anywhere">{sheet === null ? fileName : sheet}</h3>
          <p className="text-small text-quiet wrap-anywhere">
            {sheet !== null && `Sheet of ${fileName}. `}
            {written.join('; ')}
          </p>
        </div>
        <Button variant="quiet" aria-label={`Leave out ${nameOf(source)}`} onPress={() => void month.leaveOut(id)}>
          Leave out
        </Button>
      </div>
      <Select
        id={`table-${id}`}
        label="Table"
        value={table}
        placeholder="Which table is this?"
        options={tableOptions}
        {...(table === null &&
          sheet !== null && {
            hint: 'Not used, because neither its name nor its columns tell. Choose the table if it belongs to the month.',
          })}
        error={table === null && sheet === null ? 'Neither its name nor its columns tell. Choose the table, or leave it out.' : undefined}
        onChange={(chosen) => {
          const known = tables.find(({ key }) => key === chosen);
          if (known !== undefined) void month.changeSource({ id, table: known.key });
        }}
      />
      {delimiter !== null && fittingDelimiters.length > 1 && (
        <RadioGroup
          id={`delimiter-${id}`}
          label="What separates the cells"
          hint="Both would fit this file."
          inline
          value={delimiter}
          options={fittingDelimiters.map((each) => ({ value: each, label: delimiterWords[each] }))}
          onChange={(value) => {
            const chosen = fittingDelimiters.find((each) => each === value);
            if (chosen !== undefined) void month.changeSource({ id, delimiter: chosen });
          }}
        />
      )}
      {hasBothMarks && (
        <RadioGroup
          id={`mark-${id}`}
          label="Decimal mark"
          hint="Numbers of this file are written with both. Those with the other mark are not sent."
          inline
          value={decimalMark}
          options={[
            { value: '.', label: 'point, 0.5' },
            { value: ',', label: 'comma, 0,5' },
          ]}
          onChange={(value) => void month.changeSource({ id, decimalMark: value === ',' ? ',' : '.' })}
        />
      )}
      {notes.length > 0 && (
        <ul className="grid gap-1 text-small text-amber">
          {notes.map((note) => (
            <li key={note}>{note}</li>
          ))}
        </ul>
      )}
    </li>
  );
}
