import { getTemplate } from '@cairnstep/contract';
import type { Site } from '@cairnstep/contract';
import { addressOf } from '../../lib/call.ts';
import { formatMonth } from '../../lib/format.ts';
import { AddressButton } from '../../ui/button.tsx';

/** The workbook to fill in for a month: a sheet for each table, the site's participants to choose from. */
export function TemplateLink({ site, month }: { readonly site: Pick<Site, 'id' | 'code'>; readonly month: string }) {
  return (
    <AddressButton href={addressOf(getTemplate, { siteId: site.id, month })} download={`${site.code}-${month}.xlsx`}>
      Download the template of {formatMonth(month)}
    </AddressButton>
  );
}
