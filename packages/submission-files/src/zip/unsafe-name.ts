/**
 * Whether a name in an archive could lead out of the folder it is unpacked to, on any system. Nothing is unpacked to disk
 * here, but whoever made such an archive meant harm.
 */
export function isUnsafeName(name: string): boolean {
  return name === '' || /^\/|^[a-z]:|\\|\p{Cc}/iu.test(name) || name.split('/').includes('..');
}
