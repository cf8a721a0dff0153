/** Areas a consent form can name, as the countries in them (ISO 3166-1 two-letter codes). */

/** Parties of the Agreement on the European Economic Area: the 27 EU states, Iceland, Liechtenstein and Norway. */
const europeanEconomicArea = 'AT BE BG CY CZ DE DK EE ES FI FR GR HR HU IE IS IT LI LT LU LV MT NL NO PL PT RO SE SI SK'.split(' ');

const areas: Readonly<Record<string, readonly string[]>> = {
  eea: europeanEconomicArea,
  eea_uk_switzerland: [...europeanEconomicArea, 'CH', 'GB'],
  north_america: ['CA', 'US'],
};

/** Countries of an area code of the data dictionary; none for an area that is not known, so that a person decides. */
export function countriesOf(area: string, ownCountry: string | undefined): readonly string[] {
  if (area === 'own_country') return ownCountry === undefined ? [] : [ownCountry];
  return areas[area] ?? [];
}
