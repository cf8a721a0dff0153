/** Environment variables in which the global set-up tells the journeys where the product is. */
export const productUrlVariable = 'CAIRNSTEP_JOURNEY_URL';
/** The mail catcher: pages, and all mails at /messages.json. */
export const mailUrlVariable = 'CAIRNSTEP_JOURNEY_MAIL_URL';
/** The stand-in for sign-in. */
export const providerUrlVariable = 'CAIRNSTEP_JOURNEY_PROVIDER_URL';
/** The folder of files to try a submission with. */
export const exampleFilesVariable = 'CAIRNSTEP_JOURNEY_FILES';
