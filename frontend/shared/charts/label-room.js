/*
 * Keeps labels of one drawing off one another and off rectangles that are drawn anyway. `take` claims the first of
 * the tops it is offered at which the label lies free, and answers it, or null where none is free.
 */
export function labelRoom() {
  const taken = [];
  const free = (left, top, width, height) => taken.every(it =>
    left + width <= it.left || it.left + it.width <= left || top + height <= it.top || it.top + it.height <= top);
  return {
    claim(left, top, width, height) { taken.push({ left, top, width, height }); },
    take(left, tops, width, height) {
      const top = tops.find(it => free(left, it, width, height));
      if (top === undefined) return null;
      taken.push({ left, top, width, height });
      return top;
    },
  };
}
