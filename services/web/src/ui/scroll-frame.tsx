/**
 * Holds what may be wider than its room. What fits stands at its full height in the page, so that a head inside can stick to the
 * window. What is wider scrolls here, and it is said in words where there is more: a line stands at a side that is cut off, and a
 * short text under the frame. Only then it is a stop for the keyboard, which must be able to scroll it. On small screens its
 * height is bounded too, so that its head and its sideways scrolling stay in reach.
 */
import { useLayoutEffect, useState } from 'react';
import type { ReactNode } from 'react';

export interface ScrollFrameProps {
  /** Id of what names it. */
  readonly labelledBy: string;
  readonly className?: string;
  readonly children: ReactNode;
}

export function ScrollFrame({ labelledBy, className = '', children }: ScrollFrameProps) {
  const [{ overflows, hidden }, frame] = useHiddenParts();
  return (
    <div className={`grid min-w-0 ${className}`}>
      <div
        ref={frame}
        className={`scrolls relative -mx-px min-w-0 border-x print:border-0 ${overflows ? 'max-h-[80vh] overflow-auto lg:max-h-none' : ''} ${hidden.left ? 'border-l-edge' : 'border-l-transparent'} ${hidden.right ? 'border-r-edge' : 'border-r-transparent'}`}
        {...(overflows && { tabIndex: 0, role: 'region', 'aria-labelledby': labelledBy })}
      >
        {children}
      </div>
      {overflows && (
        <p aria-hidden="true" className="not-printed min-h-5 text-right text-small text-quiet">
          {whereMoreIs(hidden)}
        </p>
      )}
    </div>
  );
}

interface Hidden {
  readonly left: boolean;
  readonly right: boolean;
  readonly below: boolean;
}
const nothing: Hidden = { left: false, right: false, below: false };

function whereMoreIs({ right, below }: Hidden): string {
  if (right && below) return 'More to the right and below';
  if (right) return 'More to the right';
  return below ? 'More below' : '';
}

/** Positions of scrolling are fractions on some screens. */
const slack = 1;

function hiddenPartsOf(frame: HTMLElement): Hidden {
  return {
    left: frame.scrollLeft > slack,
    right: frame.scrollLeft + frame.clientWidth < frame.scrollWidth - slack,
    below: frame.scrollTop + frame.clientHeight < frame.scrollHeight - slack,
  };
}

interface Sight {
  readonly overflows: boolean;
  readonly hidden: Hidden;
}

function useHiddenParts(): readonly [Sight, frame: (element: HTMLDivElement | null) => void] {
  const [frame, setFrame] = useState<HTMLDivElement | null>(null);
  const [sight, setSight] = useState<Sight>({ overflows: false, hidden: nothing });
  // Before anything is drawn: a wide table must not push the page aside first.
  useLayoutEffect(() => {
    if (frame === null) return;
    const look = () => {
      const overflows = frame.scrollWidth > frame.clientWidth;
      const hidden = hiddenPartsOf(frame);
      setSight((before) => (isSame(before, { overflows, hidden }) ? before : { overflows, hidden }));
    };
    look();
    const observer = new ResizeObserver(look);
    for (const element of [frame, ...frame.children]) observer.observe(element);
    frame.addEventListener('scroll', look, { passive: true });
    return () => {
      observer.disconnect();
      frame.removeEventListener('scroll', look);
    };
  }, [frame]);
  return [sight, setFrame];
}

const isSame = (one: Sight, other: Sight): boolean =>
  one.overflows === other.overflows &&
  one.hidden.left === other.hidden.left &&
  one.hidden.right === other.hidden.right &&
  one.hidden.below === other.hidden.below;
