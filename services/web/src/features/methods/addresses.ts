/** Every method and every decision has an address of its own. */
export function methodAddress(slug: string): string {
  return `/methods/${slug}`;
}
