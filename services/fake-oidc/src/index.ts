/** A local OpenID Connect provider with invented people, for demonstration and tests. It protects nothing. */
export { demonstrationPeople, demonstrationSystems } from './demonstration-people.ts';
export type { DemonstrationPerson, DemonstrationRole, DemonstrationSystem } from './demonstration-people.ts';
export type { FakeOidc, FakeOidcOptions, MachineClient, Person } from './options.ts';
export { authenticationClass, machineScope } from './provider.ts';
export { startFakeOidc } from './start-fake-oidc.ts';
