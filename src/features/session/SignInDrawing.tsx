const FRAMES = 21;
const WIDTH = 800;
const TOP = 120;
const FLOOR = 520;

/** Height of the true arc at a share of the flight, px of the drawing. */
const trueY = (share: number) => FLOOR - 4 * (FLOOR - TOP) * share * (1 - share);
const x = (share: number) => 80 + (WIDTH - 160) * share;

const shares = Array.from({ length: FRAMES }, (_, index) => index / (FRAMES - 1));
const arc = Array.from({ length: 81 }, (_, index) => index / 80).map(
  (share) => `${x(share).toFixed(1)} ${trueY(share).toFixed(1)}`,
);

/** A flight and its spacing below it: even across, a straight ramp up and down. The idea of the product in one drawing. */
export function SignInDrawing() {
  return (
    <div className="hidden items-center justify-center overflow-hidden p-10 lg:flex" aria-hidden="true">
      <svg viewBox={`0 0 ${WIDTH} 720`} className="w-full max-w-3xl text-ink">
        <path d={`M${arc.join('L')}`} className="fill-none stroke-blueline" strokeWidth="2" strokeDasharray="7 6" />
        <path d={`M40 ${FLOOR}H${WIDTH - 40}`} className="stroke-rule" strokeWidth="1.5" />
        {shares.map((share) => (
          <circle key={share} cx={x(share)} cy={trueY(share)} r="5" fill="currentColor" />
        ))}
        <path d={`M40 628H${WIDTH - 40}`} className="stroke-rule" strokeWidth="1.5" />
        {shares.slice(1).map((share, index) => {
          const rise = (trueY(shares[index]!) - trueY(share)) * 0.95;
          return (
            <rect
              key={share}
              x={x(share) - 27}
              y={rise > 0 ? 628 - rise : 628}
              width="22"
              height={Math.max(1, Math.abs(rise))}
              rx="3"
              className="fill-bar"
            />
          );
        })}
      </svg>
    </div>
  );
}
