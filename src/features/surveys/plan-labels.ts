export interface MarkOnPage {
  x: number;
  y: number;
  name: string;
}

export interface LabelPlace {
  dx: number;
  dy: number;
  anchor: 'start' | 'middle';
  /** Beyond the nearest names, so that a thin line has to lead to it. */
  isFar: boolean;
}

const CHARACTER_PX = 6.8;
const LINE_PX = 13;
const DESCENT_PX = 3;
/** Between two names beside each other. */
const GAP_PX = 4;
/** Half of the largest mark, a borehole's square. */
const MARK_PX = 9;

const place = (dx: number, dy: number, anchor: LabelPlace['anchor'], isFar = false): LabelPlace => ({
  dx,
  dy,
  anchor,
  isFar,
});

/** None at the left, where the name of a line stands. */
const PLACES: readonly LabelPlace[] = [
  place(12, 4, 'start'),
  place(0, -14, 'middle'),
  place(0, 24, 'middle'),
  place(0, -31, 'middle', true),
  place(0, 41, 'middle', true),
];

interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

const overlaps = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

function labelBox({ x, y, name }: MarkOnPage, { dx, dy, anchor }: LabelPlace): Box {
  const width = name.length * CHARACTER_PX;
  const left = x + dx - (anchor === 'start' ? 0 : width / 2);
  return {
    left: left - GAP_PX / 2,
    right: left + width + GAP_PX / 2,
    top: y + dy - LINE_PX,
    bottom: y + dy + DESCENT_PX,
  };
}

const markBox = ({ x, y }: MarkOnPage): Box => ({
  left: x - MARK_PX,
  right: x + MARK_PX,
  top: y - MARK_PX,
  bottom: y + MARK_PX,
});

/** Distance to the nearest other mark, px. */
const roomAround = (mark: MarkOnPage, marks: readonly MarkOnPage[]): number =>
  marks.reduce(
    (least, other) =>
      other === mark ? least : Math.min(least, Math.hypot(other.x - mark.x, other.y - mark.y)),
    Infinity,
  );

/** What a name takes up at a place: itself, and the line that leads to one far off. */
function boxesOf(mark: MarkOnPage, at: LabelPlace): Box[] {
  const label = labelBox(mark, at);
  if (!at.isFar) return [label];
  const own = markBox(mark);
  const [top, bottom] = at.dy < 0 ? [label.bottom, own.top] : [own.bottom, label.top];
  return [label, { left: mark.x - 1, right: mark.x + 1, top, bottom }];
}

/**
 * A place for each name that covers no mark and no other name; null where there is none. The marks nearest to another, as
 * a sounding at a borehole, choose first: they have the fewest places. Names far from their marks are placed on request.
 */
export function placeLabels(marks: readonly MarkOnPage[], mayBeFar = true): (LabelPlace | null)[] {
  const allowed = PLACES.filter(({ isFar }) => mayBeFar || !isFar);
  const taken = marks.map(markBox);
  const places = marks.map((): LabelPlace | null => null);
  const room = marks.map((mark) => roomAround(mark, marks));
  for (const index of [...marks.keys()].toSorted((a, b) => room[a]! - room[b]!)) {
    const mark = marks[index]!;
    const free = allowed.find((candidate) =>
      boxesOf(mark, candidate).every((box) => !taken.some((other) => overlaps(box, other))),
    );
    if (free === undefined) continue;
    taken.push(...boxesOf(mark, free));
    places[index] = free;
  }
  return places;
}
