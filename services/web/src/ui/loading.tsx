/** What is being fetched, in words; a still page needs no turning wheel. */
export function Loading({ children }: { readonly children: string }) {
  return (
    <p role="status" data-waiting className="py-4 text-quiet">
      {children}
    </p>
  );
}
