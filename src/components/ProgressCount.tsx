import clsx from 'clsx';

export interface ProgressCountProps {
  /** What is being done: "Reading". */
  label: string;
  done: number;
  total: number;
  /** What is counted: "frames". */
  unit: string;
  className?: string;
}

/** Long work with a real count: "Reading 24 of 48 frames". */
export function ProgressCount({ label, done, total, unit, className }: ProgressCountProps) {
  return (
    <div className={clsx('text-sm', className)}>
      <div className="flex items-baseline justify-between gap-3">
        <span className="font-semibold">{label}</span>
        <span className="font-mono text-xs text-graphite">
          {done} of {total} {unit}
        </span>
      </div>
      <progress
        aria-label={label}
        aria-valuetext={`${done} of ${total} ${unit}`}
        value={done}
        max={Math.max(1, total)}
        className="mt-1 block h-1.5 w-full appearance-none overflow-hidden rounded-full bg-well [&::-moz-progress-bar]:bg-ink [&::-webkit-progress-bar]:bg-well [&::-webkit-progress-value]:bg-ink"
      />
    </div>
  );
}
