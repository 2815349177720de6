/** Stands beside the button wherever footage may be posted. */
export function FilmingCaution() {
  return (
    <p className="border-l-2 border-ink pl-3 text-xs text-graphite">
      Is this reference footage? Throws, falls and jumps are filmed only with those trained for it, under local rules.
    </p>
  );
}
