import { type ReactNode, useRef } from 'react';
import { useSize } from '../../lib/useSize.ts';

const CARD = 540;

interface HangingCardProps {
  /** Where the pin is, px from the left of the score; beyond its ends when it is scrolled out of sight. */
  pinX: number;
  /** Left end of the axis. */
  least: number;
  /** It takes the whole width, as on a phone. */
  whole: boolean;
  children: ReactNode;
}

/** Hangs what belongs to a frame below the score, on a thread from its pin. */
export function HangingCard({ pinX, least, whole, children }: HangingCardProps) {
  const room = useRef<HTMLDivElement>(null);
  const { width } = useSize(room);
  const pin = Math.min(Math.max(pinX, least + 4), width - 4);
  const left = whole ? 14 : Math.max(0, Math.min(pin, width - CARD));
  const straight = Math.abs(left - pin) < 1;
  return (
    <div ref={room} className="relative pt-3.5">
      <div
        className="absolute -top-2.5 h-[25px] border-l-[1.5px] border-ink"
        style={{ left: pin - 0.75 }}
        aria-hidden="true"
      />
      <div
        className="animate-settle border border-ink bg-sheet shadow-[0_6px_18px_#0000001c]"
        style={{
          marginLeft: left,
          width: whole ? 'calc(100% - 28px)' : Math.min(CARD, width),
          borderRadius: straight ? '0 12px 12px 12px' : 12,
        }}
      >
        {children}
      </div>
    </div>
  );
}
