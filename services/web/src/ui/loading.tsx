/** What is being fetched, in words; a still page needs no turning wheel. */
export function Loading({ children }: { readonly children: string }) {
  return (
    <p role="status" className="py-4 text-quiet">
      {children}
    </p>
  );
}
