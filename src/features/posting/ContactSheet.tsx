import type { DraftPicture } from '../../../shared/api/drafts.ts';
import { Card } from '../../components/Card.tsx';
import { CrossGlyph } from '../../components/CrossGlyph.tsx';

export interface ContactSheetProps {
  pictures: DraftPicture[];
  addresses: ReadonlyMap<string, string>;
  missing: number[];
  onRemove: (name: string) => void;
}

/** The frames that arrived, in their order, with the gaps between them left open. */
export function ContactSheet({ pictures, addresses, missing, onRemove }: ContactSheetProps) {
  const gapsBefore = (index: number) => {
    const here = pictures[index]?.number;
    const before = pictures[index - 1]?.number;
    return here == null || before == null ? [] : missing.filter((number) => number > before && number < here);
  };
  return (
    <Card className="px-4 py-3" aria-labelledby="contact-sheet">
      <h2 id="contact-sheet" className="mb-2 text-md">
        {pictures.length} {pictures.length === 1 ? 'frame' : 'frames'}
        {pictures[0] && (
          <span className="ml-2 font-sans text-sm font-normal tracking-normal text-graphite">
            {pictures[0].width} × {pictures[0].height} px
          </span>
        )}
      </h2>
      <ol className="grid max-h-112 grid-cols-[repeat(auto-fill,minmax(6.5rem,1fr))] gap-2 overflow-y-auto p-0.5">
        {pictures.map((picture, index) => (
          <li key={picture.name} className="contents">
            {gapsBefore(index).length > 0 && <Gap numbers={gapsBefore(index)} />}
            <Tile picture={picture} address={addresses.get(picture.name)} onRemove={onRemove} />
          </li>
        ))}
      </ol>
    </Card>
  );
}

interface TileProps {
  picture: DraftPicture;
  address: string | undefined;
  onRemove: (name: string) => void;
}

function Tile({ picture, address, onRemove }: TileProps) {
  return (
    <div className="group relative">
      <div
        className="overflow-hidden rounded-mark border border-rule bg-surround"
        style={{ aspectRatio: `${picture.width} / ${picture.height}` }}
      >
        {address && <img src={address} alt="" loading="lazy" decoding="async" className="size-full object-contain" />}
      </div>
      <p className="truncate text-center font-mono text-2xs text-graphite" title={picture.name}>
        {picture.number ?? picture.name}
      </p>
      <button
        type="button"
        aria-label={`Take out ${picture.name}`}
        title="Take out"
        onClick={() => onRemove(picture.name)}
        className="absolute top-0 right-0 grid size-6 place-items-center rounded-control bg-sheet text-ink opacity-0 group-focus-within:opacity-100 group-hover:opacity-100 touch:size-11 touch:opacity-100"
      >
        <CrossGlyph />
      </button>
    </div>
  );
}

function Gap({ numbers }: { numbers: number[] }) {
  const first = numbers[0];
  const last = numbers.at(-1);
  return (
    <div>
      <div className="grid aspect-video place-items-center rounded-mark border border-dashed border-graphite text-2xs text-graphite">
        missing
      </div>
      <p className="text-center font-mono text-2xs text-graphite">{first === last ? first : `${first}–${last}`}</p>
    </div>
  );
}
