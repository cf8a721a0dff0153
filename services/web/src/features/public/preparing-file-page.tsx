/** The preparing page as a file for those who rather not have it from the registry each time. */
import { useQuery } from '@tanstack/react-query';
import { formatBytes } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { AddressButton } from '../../ui/button.tsx';
import { Facts } from '../../ui/facts.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { preparingFileQuery } from './preparing-file.queries.ts';

const savedAs = 'cairnstep-prepare.html';

const commands = [
  { system: 'Windows, command prompt', command: `certutil -hashfile ${savedAs} SHA256` },
  { system: 'Windows, PowerShell', command: `Get-FileHash ${savedAs} -Algorithm SHA256` },
  { system: 'macOS', command: `shasum -a 256 ${savedAs}` },
  { system: 'Linux', command: `sha256sum ${savedAs}` },
];

export default function PreparingFilePage() {
  const query = useQuery(preparingFileQuery());
  return (
    <Page
      title="Prepare without the server"
      lead={
        <p>
          The page that takes names, record numbers and dates out of a clinic’s files is one file. Kept on the clinic’s own disk, it works
          without the registry and without a network.
        </p>
      }
      note={
        <p>
          The page that hides what identifies people is served by those it is hidden from. Whoever does not want to rely on them uses this
          file, and checks it once.
        </p>
      }
    >
      <Section
        title="The file"
        id="file"
        note={
          <p>
            It is the same file, byte for byte, that opens within these pages when a month is prepared here. Its security policy lets it
            connect to nothing.
          </p>
        }
      >
        <Answer query={query} waiting="Reading what the file hashes to.">
          {({ bytes, sha256 }) => (
            <div className="grid justify-items-start gap-5">
              <Facts
                facts={[
                  { term: 'File', value: savedAs },
                  { term: 'Size', value: <span className="numbers">{formatBytes(bytes)}</span> },
                  { term: 'SHA-256', value: <code className="select-all">{sha256}</code> },
                ]}
              />
              <AddressButton href="/prepare.html" download={savedAs} variant="primary">
                Download the file
              </AddressButton>
            </div>
          )}
        </Answer>
      </Section>
      <Section
        title="Check it"
        id="check"
        note={
          <p>
            A hash read on this page only tells that the download is whole. It tells more when it comes another way: from another clinic, or
            from your own build of the published source, which gives the same file.
          </p>
        }
      >
        <p className="mb-3 max-w-2xl">
          Let your computer work out the hash of the file that you saved, and compare it with the one above. They have to be the same to the
          last character.
        </p>
        <Facts facts={commands.map(({ system, command }) => ({ term: system, value: <code className="select-all">{command}</code> }))} />
      </Section>
      <Section title="Use it" id="use">
        <ol className="grid max-w-2xl list-decimal gap-2 pl-5">
          <li>Open the saved file in a browser. The network can be off.</li>
          <li>Open the site’s key file, choose the clinic’s files, and look at what would be left of them.</li>
          <li>Save the prepared files and the key file.</li>
          <li>In the registry, open the month and drop the prepared files where files that are already prepared go.</li>
        </ol>
      </Section>
    </Page>
  );
}
