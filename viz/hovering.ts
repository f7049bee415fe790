/** The pointer on the picture: the nearest design is named, a click opens it. */
import { type Desk, need, opened } from './desk.ts';
import { designWords } from './views/picture-words.ts';
import type { TradeoffScales } from './views/tradeoff-scales.ts';

export type Finder = (x: number, y: number) => number | undefined;

export function hover(
  document: Document,
  box: HTMLElement,
  desk: Desk,
  nearest: Finder,
  scales: () => TradeoffScales | undefined,
): void {
  const card = need(document, 'hover');
  let shown: number | undefined;
  const place = (event: PointerEvent | MouseEvent): readonly [number, number] => {
    const bounds = box.getBoundingClientRect();
    return [event.clientX - bounds.left, event.clientY - bounds.top];
  };
  const hide = () => {
    shown = undefined;
    card.hidden = true;
  };
  box.addEventListener('pointermove', (event) => {
    if (event.buttons > 0) return hide();
    const index = nearest(...place(event));
    const drawn = scales();
    if (index === undefined || drawn === undefined) return hide();
    if (index === shown) return;
    shown = index;
    fillCard(card, designWords(desk.bench.dataset, index));
    const [x, y] = at(desk, drawn, index);
    const isLeft = x > drawn.frame.width * 0.6;
    card.style.transform = `translate(${box.offsetLeft + x + (isLeft ? -14 : 14)}px, ${box.offsetTop + y}px) translate(${isLeft ? '-100%' : '0'}, -50%)`;
    card.hidden = false;
  });
  box.addEventListener('pointerleave', hide);
  box.addEventListener('click', (event) => {
    const index = nearest(...place(event));
    if (index !== undefined) desk.set(opened(desk.bench.dataset.designs[index]?.id ?? ''));
  });
}

function fillCard(card: HTMLElement, words: readonly string[]): void {
  card.replaceChildren(
    ...words.map((word, i) => {
      const line = card.ownerDocument.createElement(i === 0 ? 'strong' : 'span');
      line.textContent = word;
      return line;
    }),
  );
}

export function at(desk: Desk, { x, y }: TradeoffScales, index: number): readonly [number, number] {
  const { dataset } = desk.bench;
  const { state } = desk.scene();
  const value = (name: string) => dataset.byKey.get(`o.${name}`)?.values[index] ?? 0;
  return [x(value(state.x)), y(value(state.y))];
}
