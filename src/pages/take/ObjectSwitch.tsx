import clsx from 'clsx';

interface ObjectSwitchProps {
  ids: readonly string[];
  chosen: string | null;
  onChoose: (id: string) => void;
}

/** Which thing's spacing the lanes show, where several fly. */
export function ObjectSwitch({ ids, chosen, onChoose }: ObjectSwitchProps) {
  if (ids.length < 2) return null;
  return (
    <fieldset aria-label="Thing in the lanes" className="flex overflow-hidden rounded-control border border-rule">
      {ids.map((id) => (
        <button
          key={id}
          type="button"
          aria-pressed={id === chosen}
          aria-label={`Thing ${id}`}
          onClick={() => onChoose(id)}
          className={clsx(
            'min-h-6.5 min-w-7 text-xs font-semibold touch:min-h-11 touch:min-w-11',
            id === chosen ? 'bg-ink text-sheet' : 'text-graphite hover:text-ink',
          )}
        >
          {id}
        </button>
      ))}
    </fieldset>
  );
}
