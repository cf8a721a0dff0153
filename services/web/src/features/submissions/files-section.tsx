/** Read and prepare: the month's files, chosen, each given its table, and sent. */
import type { Submission } from '@cairnstep/contract';
import { formatCount, formatMonth } from '../../lib/format.ts';
import { LinkButton } from '../../ui/button.tsx';
import { FileDrop } from '../../ui/file-drop.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Section } from '../../ui/page.tsx';
import type { Outgoing } from './outgoing-files.ts';
import { OutgoingList } from './outgoing-list.tsx';
import { SentFiles } from './sent-files.tsx';
import { TemplateLink } from './template-link.tsx';

export interface FilesSectionProps {
  readonly submission: Submission;
  readonly outgoing: Outgoing;
  readonly isOpen: boolean;
}

export function FilesSection({ submission, outgoing, isOpen }: FilesSectionProps) {
  const mended = submission.files.reduce((sum, file) => sum + file.mended, 0);
  return (
    <Section
      title="Files"
      id="files"
      note={
        <>
          <p>
            One workbook with a sheet for each table, as in the template; or one CSV file a table. Which table a CSV file is of is read from
            its name; you can change it.
          </p>
          <p>
            A table without a file, or with an empty sheet, stays as it is. In a file that you send, rows of this month that the registry
            has and the file has not are removed, after you have seen them. People and consents are only added or changed.
          </p>
          <p>
            Participant codes and study days only: no names, no record numbers, no dates. A file with any of them is not sent: it is looked
            through in your browser first, and by the registry again. Of a workbook only the cells are kept.
          </p>
        </>
      }
    >
      <div className="grid gap-6">
        <Notice kind="warning" title="Serious events go to the clinic first.">
          <p>
            Autonomic dysreflexia, a fall with injury, a fracture or skin breakdown: follow the clinic’s emergency and reporting protocol
            before you enter it here. The registry alerts nobody.
          </p>
        </Notice>
        {isOpen && mended > 0 && (
          <Notice title={`${formatCount(mended, 'cell')} ${mended === 1 ? 'was' : 'were'} mended on this page.`}>
            <p>
              A file that comes in the place of another, prepared here or sent as it is, takes the cells mended in that one with it. The
              findings workbook holds them.
            </p>
          </Notice>
        )}
        {isOpen && (
          <div className="grid justify-items-start gap-2">
            <h3 className="font-semibold">The files are as the clinic has them</h3>
            <p className="max-w-2xl">
              With names, record numbers and dates: these are taken out in your browser. You see what is left before it is sent.
            </p>
            <LinkButton variant={submission.files.length === 0 ? 'primary' : 'secondary'} to={`/submit/${submission.id}/prepare`}>
              Prepare the clinic’s files
            </LinkButton>
          </div>
        )}
        {isOpen && (
          <FileDrop
            label={`The files are already prepared: workbook or CSV files of ${formatMonth(submission.month)}`}
            hint="All tables of the month at once, or one by one. Each is looked through here before it is sent."
            accept={['.xlsx', '.csv']}
            multiple
            isDisabled={outgoing.isSending}
            onFiles={outgoing.add}
          />
        )}
        {isOpen && (
          <div>
            <TemplateLink site={submission.site} month={submission.month} />
          </div>
        )}
        <OutgoingList submission={submission} outgoing={outgoing} />
        <SentFiles submission={submission} isOpen={isOpen && !outgoing.isSending} unsent={outgoing.files.length} onChoose={outgoing.add} />
      </div>
    </Section>
  );
}
