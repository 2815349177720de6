import { Link } from 'react-router';
import type { FeedCard } from '../../../shared/api/feed.ts';
import { shownFrame } from '../../../shared/reading/document.ts';
import { FrameTag } from '../../components/FrameTag.tsx';
import { paths } from '../../lib/paths.ts';

/** Beyond this share of the picture's width the note would have no room to its right. */
const FURTHEST = 0.55;

/** What was said last, hanging from the frame it speaks about; or, before anyone spoke, what the animator says of the take. */
export function CardTalk({ slug, card }: { slug: string; card: FeedCard }) {
  const { take, talk, poster } = card;
  const [asked, answered] = talk;

  if (!asked) {
    if (!take.changed && !take.intended) return null;
    return (
      <p className="border-t border-rule px-4.5 py-2.5 text-sm">
        <b className="font-semibold">{poster.name}:</b> {take.changed || take.intended}
      </p>
    );
  }
  const frame = shownFrame(asked.frame, take.firstFrame);
  return (
    <div className="border-t border-rule px-4.5 md:pl-[17.9rem]">
      <Link
        to={paths.take(slug, take.shotNumber, take.number, frame)}
        style={{ marginLeft: `${hangsFrom(card, asked.frame) * 100}%` }}
        className="mt-0 mb-3 block border-l-[1.5px] border-ink pt-1.5 pl-3 text-sm no-underline touch:min-h-11 hover:bg-paper max-md:!ml-0"
      >
        <span className="block">
          <b className="font-semibold">{asked.author.name}</b> <FrameTag>{frame}</FrameTag> {asked.excerpt}
        </span>
        {answered && (
          <span className="mt-0.5 block text-graphite">
            {answered.author.name}: {answered.excerpt}
          </span>
        )}
      </Link>
    </div>
  );
}

/** Where along the picture the frame of a note lies: under the thing's mark, or by time when it was not seen there. */
function hangsFrom({ take }: FeedCard, frame: number): number {
  const mark = take.sketch?.marks.find((one) => one.frame === frame);
  const share = mark && take.sketch ? mark.x / take.sketch.width : (frame - 0.5) / take.frames;
  return Math.min(FURTHEST, Math.max(0, share));
}
