/** What the header of a column says about its cells, by whole words. */
import type { IdentifierClass, Strength } from './identifier-class.ts';
import type { Hit } from './hit.ts';
import { headerCondition } from './header-condition.ts';
import type { HeaderCondition } from './header-condition.ts';
import { headerTokens } from './header-tokens.ts';
import {
  aboutDateWords,
  amountWords,
  dateWords,
  mobileWords,
  numberWords,
  personWords,
  phoneWords,
  postalWords,
  staffWords,
  vehicleWords,
} from './header-words.ts';

const conditions: readonly (readonly [IdentifierClass, Strength, HeaderCondition])[] = [
  [
    'person_name',
    'block',
    {
      any: `surname surnames lastname firstname forename forenames familyname fullname givenname middlename patientname nombre nombres apellido
        apellidos vorname nachname familienname prenom nom cognome voornaam achternaam fornavn efternavn etternavn fornamn efternamn sobrenome
        initials maiden nickname kin carer caregiver spouse guardian`,
      together: [['initial', 'middle patient participant']],
      alone: [{ words: 'name names', beside: personWords }, { words: 'wife husband mother father daughter son partner relative' }],
      unless: `${amountWords} ${staffWords}`,
    },
  ],
  [
    'staff_name',
    'warn',
    { any: staffWords, together: [['by', 'entered recorded exported created completed signed performed assessed']], unless: amountWords },
  ],
  [
    'record_number',
    'block',
    {
      any: 'mrn hospno patientid patientno hospitalno chartno casenumber patnr patientennummer fallnummer aktenzeichen',
      together: [
        [
          'hospital patient patients pt medical record records chart case clinic file admission encounter registration client person subject participant',
          numberWords,
        ],
        ['study trial', 'id ident identifier'],
      ],
      unless: 'insurance plan policy vehicle driver licence license',
    },
  ],
  [
    'national_id',
    'block',
    {
      any: 'nino ppsn bsn ahv nhsno nhsnumber personnummer fodselsnummer curp dni aadhaar passport passportno henkilotunnus',
      together: [
        ['nhs chi cpr hcn ihi phn sin nif nir', numberWords],
        ['national citizen', `${numberWords} insurance`],
      ],
      alone: [{ words: 'nhs chi nif nir' }],
    },
  ],
  ['ssn', 'block', { any: 'ssn', together: [['social', 'security']] }],
  ['full_date', 'block', { any: dateWords, together: [['day', 'birth']], alone: [{ words: 'birth' }], unless: aboutDateWords }],
  [
    'part_date',
    'block',
    {
      together: [['month quarter', 'injury birth admission surgery discharge session visit onset accident operation']],
      unless: 'per since in after relative study',
    },
  ],
  [
    'geography',
    'block',
    {
      any: `${postalWords} city town village county address addr street adresse direccion ciudad ville wohnort suburb parish borough district
        municipality hometown residence birthplace neighbourhood neighborhood strasse`,
      together: [
        ['post', 'code'],
        ['place', 'birth'],
      ],
      unless: 'email mail ip ipv mac web url website file',
    },
  ],
  ['coordinates', 'block', { any: 'gps latitude longitude geolocation coordinates', alone: [{ words: 'lat lon lng', beside: 'geo' }] }],
  [
    'phone',
    'block',
    {
      any: phoneWords,
      together: [
        [mobileWords, numberWords],
        ['contact', 'no nr num number numbers'],
      ],
      alone: [{ words: 'mobile', beside: 'home work private patient contact' }],
      unless: amountWords,
    },
  ],
  ['email', 'block', { any: 'email emails', together: [['e', 'mail']], alone: [{ words: 'mail', beside: 'address' }] }],
  ['url', 'block', { any: 'url uri website weblink hyperlink homepage', unless: amountWords }],
  ['ip', 'block', { any: 'ip ipv ipaddress' }],
  [
    'device_serial',
    'block',
    {
      any: 'udi imei imsi serialno serialnumber seriennummer',
      together: [
        ['serial', `${numberWords} code device robot exoskeleton stimulator pump implant sensor treadmill orthosis`],
        ['mac', 'address addr'],
        ['sn', 'device robot sensor pump implant'],
        ['device robot sensor implant', 'id identifier'],
      ],
      alone: [{ words: 'serial' }, { words: 'mac' }, { words: 'sn' }],
      unless: `casting ${amountWords}`,
    },
  ],
  [
    'image_or_biometric',
    'block',
    {
      any: 'photo photos photograph picture pictures fingerprint fingerprints dicom headshot selfie',
      alone: [
        {
          words: 'video videos image images audio recording voice face facial clip footage',
          beside: 'file files path link url filename name upload session patient participant',
        },
      ],
      unless: amountWords,
    },
  ],
  [
    'account_or_plan',
    'block',
    {
      any: 'iban medicare medicaid creditcard versichertennummer krankenkasse accountno policynumber',
      together: [['insurance insurer account policy plan beneficiary member bank card', numberWords]],
      alone: [{ words: 'account' }],
      unless: `national ${staffWords}`,
    },
  ],
  [
    'licence_or_vehicle',
    'block',
    {
      any: vehicleWords,
      together: [
        ['plate', 'licence license number registration'],
        ['licence license driver drivers', numberWords],
      ],
      unless: `${amountWords} ${staffWords}`,
    },
  ],
  [
    'licence_or_vehicle',
    'warn',
    {
      together: [
        ['certificate certification', numberWords],
        ['licence license', staffWords],
      ],
      unless: amountWords,
    },
  ],
  [
    'free_text',
    'warn',
    {
      any: `comment comments note notes remark remarks description narrative freetext memo observations observation bemerkung bemerkungen
        anmerkung anmerkungen notiz notizen kommentar kommentare observaciones comentarios remarques opmerkingen`,
      together: [['free', 'text']],
      unless: amountWords,
    },
  ],
];

const rules = conditions.map(([name, strength, condition]) => ({ class: name, strength, holds: headerCondition(condition) }));

/** The identifiers that a header announces. */
export function headerHits(header: string): Hit[] {
  const words = headerTokens(header);
  return rules.filter(({ holds }) => holds(words)).map((rule): Hit => ({ class: rule.class, strength: rule.strength }));
}
