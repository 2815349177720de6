/** The spandrel above an arch, and the thing at the top of its flight. */
export function BrandMark({ className = 'w-7' }: { className?: string }) {
  return (
    <svg viewBox="0 0 30 24" className={className} aria-hidden="true">
      <path d="M1 1H29V23H25.5C24 10 19.5 6 15 6S6 10 4.5 23H1Z" fill="currentColor" />
      <circle cx="15" cy="6" r="2.6" className="fill-redline" />
    </svg>
  );
}
