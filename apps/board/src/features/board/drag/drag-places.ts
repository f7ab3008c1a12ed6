/** Places where a row can be dropped, and how the arrow keys go from one to the next while something is carried. */
import { closestCenter, pointerWithin, type CollisionDetection, type KeyboardCoordinateGetter } from '@dnd-kit/core';

export const myHands = 'my-hands';

const memberPrefix = 'member ';
export const placeOfMember = (memberId: string): string => memberPrefix + memberId;
export const memberOfPlace = (place: string): string | null =>
  place.startsWith(memberPrefix) ? place.slice(memberPrefix.length) : null;

/** With a pointer, what lies under it; with the keys, what the row was moved onto. */
export const placeUnder: CollisionDetection = (args) => {
  if (args.pointerCoordinates !== null) return pointerWithin(args);
  const touched = args.droppableContainers.filter(({ rect }) => {
    const place = rect.current;
    return (
      place !== null &&
      Math.abs(place.left - args.collisionRect.left) < 2 &&
      Math.abs(place.top - args.collisionRect.top) < 2
    );
  });
  return closestCenter({ ...args, droppableContainers: touched });
};

const forward = new Set(['ArrowDown', 'ArrowRight']);
const backward = new Set(['ArrowUp', 'ArrowLeft']);

export const nextPlace: KeyboardCoordinateGetter = (event, { context }) => {
  const isForward = forward.has(event.code);
  if (!isForward && !backward.has(event.code)) return undefined;
  event.preventDefault();
  const places = context.droppableContainers
    .getEnabled()
    .flatMap((container) => {
      const rect = context.droppableRects.get(container.id);
      return rect === undefined ? [] : [{ id: container.id, rect }];
    })
    .sort((a, b) => a.rect.top - b.rect.top);
  const at = places.findIndex((place) => place.id === context.over?.id);
  const next = places[at < 0 ? (isForward ? 0 : places.length - 1) : at + (isForward ? 1 : -1)];
  return next === undefined ? undefined : { x: next.rect.left, y: next.rect.top };
};
