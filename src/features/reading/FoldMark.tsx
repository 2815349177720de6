/** Shows at the right end of a summary whether what follows is folded. */
export function FoldMark() {
  return (
    <svg
      viewBox="0 0 12 12"
      className="pencil absolute top-1.5 right-0 size-3 text-graphite transition-transform duration-150 in-open:rotate-180"
      aria-hidden="true"
    >
      <path d="M2 4l4 4 4-4" />
    </svg>
  );
}
