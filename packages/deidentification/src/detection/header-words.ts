/** Words that several rules about headers share. */

/** Words that make of a header an amount or a description: `therapist_hours` names no person, `cell_count` no telephone. */
export const amountWords = `
  accuracy amount angle available average class consented count counts deg degrees distance duration flag format frequency grade held hour
  hours kg kind known length level lost max mean median min minute minutes missing mode months pct per percent percentage precision present
  profession quality rate ratio role s sample samples scale score sec second seconds share speed status sum total type units used weeks
  weight years
`;

/** Words that make of a date header a statement about a date. Lowest and highest are not among them: both are dates. */
export const aboutDateWords = 'accuracy estimated flag format known missing offset precision quality shift source status type';

/** Words for a number that names something. */
export const numberWords = 'id ident identifier identity ids no nr num number numbers nummer numero';

export const dateWords = `
  date dates datum datetime fecha dato dob dod doa doi dateofbirth birthdate birthday geburtsdatum geburtstag injurydate
  admissiondate sessiondate visitdate unfalldatum aufnahmedatum
`;

export const ageWords = 'age ages alter edad leeftijd';

export const personWords = `
  birth carer caregiver child client contact emergency family father first full given husband last legal maiden middle mother next of
  participant partner patient person preferred pt relative spouse subject the user wife guardian
`;

export const staffWords = `
  assessor author clinician consultant doctor examiner nurse operator ot physician physio physiotherapist rater recorder staff supervisor
  surgeon technician therapist trainer
`;

/** Words that name a postal code. */
export const postalWords = 'zip zipcode postcode postalcode postal plz postleitzahl';

export const vehicleWords = 'vin vehicle numberplate kennzeichen chassis';

export const phoneWords = 'phone phones telephone telefon telefono telefoon tel fax telefax cellphone mobilephone handynummer phoneno';

export const mobileWords = 'mobile cell handy gsm landline pager';
