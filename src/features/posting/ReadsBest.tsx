const ADVICE = [
  'One thing in the air. Where two fly, each is read by itself.',
  'Frames of one size, in the order of their numbers.',
  'A few frames before the take-off and after the landing, so that both contacts are found.',
  'The flight whole: what leaves the picture is read as far as it is seen.',
];

/** What a strip should hold, said before it is exported twice. */
export function ReadsBest() {
  return (
    <section className="px-2 py-1 text-sm text-graphite" aria-labelledby="reads-best">
      <h2 id="reads-best" className="text-md text-ink">
        What reads best
      </h2>
      <ul className="mt-1 max-w-prose list-disc space-y-0.5 pl-4.5">
        {ADVICE.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </section>
  );
}
