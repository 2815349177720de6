/** The cross that closes. */
export function CrossGlyph() {
  return (
    <svg viewBox="0 0 20 20" className="pencil size-4" aria-hidden="true">
      <path d="M4 4.5C8 8 12 12 16 16M15.6 4C12 8.4 8 12 4.4 16" />
    </svg>
  );
}
