import { ageBands, completenessClasses, levelGroups, regionGroups, timeBands } from '@cairnstep/scoring';
import { Section } from '../../../ui/page.tsx';
import { Table } from '../../../ui/table.tsx';
import type { Column } from '../../../ui/table.tsx';
import type { Decision } from '../decision.ts';

export const groupsAndBands: Decision = {
  slug: 'groups-and-bands',
  title: 'Groups of levels, classes and bands',
  summary:
    'People are grouped by level, completeness, age and time since injury. Each set of groups has a name with a version; its edges are printed with every figure, because other sets are in use elsewhere.',
  note: 'Both edges belong to a group. A new set gets a new name: old figures keep theirs.',
  Body,
};

function Body() {
  return (
    <>
      <Section
        title="Level groups"
        id="levels"
        note={
          <>
            <p>By the neurological level of injury. The neck in the two parts of the international data sets; the trunk split at T9/T10.</p>
            <p>Intact: no deficit left. Not determinable: several groups are possible, counted apart.</p>
          </>
        }
      >
        <div className="grid gap-8">
          <Groups id="level-groups" caption={`${levelGroups.name} (${levelGroups.id})`} groups={levelGroups.groups} />
          <Groups
            id="regions"
            caption={`${regionGroups.name} (${regionGroups.id}), as exports may coarsen them`}
            groups={regionGroups.groups}
          />
        </div>
      </Section>
      <Section
        title="Completeness"
        id="completeness"
        note={<p>The classes overlap: motor complete takes in complete and sensory incomplete. Their counts must not be added up.</p>}
      >
        <Groups
          id="completeness"
          caption={`Classes of the AIS grade (${completenessClasses.id})`}
          groups={completenessClasses.classes.map(({ id, label }) => ({ id, label }))}
        />
      </Section>
      <Section title="Age and time since injury" id="bands" note={<p>Completed years; a year has 365.25 days.</p>}>
        <div className="grid gap-8">
          {[ageBands, timeBands].map(({ id, name, bands }) => (
            <Groups key={id} id={id} caption={`${name} (${id})`} groups={bands} />
          ))}
        </div>
      </Section>
    </>
  );
}

interface Group {
  readonly id: string;
  readonly label: string;
}

function Groups({ id, caption, groups }: { readonly id: string; readonly caption: string; readonly groups: readonly Group[] }) {
  return (
    <Table
      id={id}
      caption={caption}
      columns={columns}
      rows={groups}
      rowKey={(group) => group.id}
      empty="The set is empty."
      isSortable={false}
    />
  );
}

const columns: readonly Column<Group>[] = [
  { key: 'label', header: 'Group, with its edges', value: ({ label }) => label, isRowHeader: true },
  { key: 'id', header: 'Code in files', value: ({ id }) => id, cell: ({ id }) => <code>{id}</code> },
];
