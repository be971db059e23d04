/**
 * Moves positions on one axis apart until neighbours are at least `gap` from each other, keeping their order and
 * staying within [low, high] where there is room. Input need not be sorted; the answer is in input order.
 */
export function spread(positions: number[], gap: number, low: number, high: number): number[] {
  const order = positions.map((_, index) => index).sort((a, b) => at(positions, a) - at(positions, b));
  const placed = order.map((index) => at(positions, index));
  for (let round = 0; round < placed.length * 4; round += 1) {
    let moved = false;
    for (let next = 1; next < placed.length; next += 1) {
      const lack = gap - (at(placed, next) - at(placed, next - 1));
      if (lack <= 1e-6) continue;
      placed[next - 1] = at(placed, next - 1) - lack / 2;
      placed[next] = at(placed, next) + lack / 2;
      moved = true;
    }
    if (!moved) break;
  }
  settle(placed, gap, low, high);
  const answer = new Array<number>(positions.length).fill(0);
  order.forEach((index, place) => {
    answer[index] = at(placed, place);
  });
  return answer;
}

/** Two sweeps: up from the low end, then back from the high end, which wins where both can't be kept. */
function settle(placed: number[], gap: number, low: number, high: number): void {
  let least = low;
  for (let place = 0; place < placed.length; place += 1) {
    placed[place] = Math.max(at(placed, place), least);
    least = at(placed, place) + gap;
  }
  let most = high;
  for (let place = placed.length - 1; place >= 0; place -= 1) {
    placed[place] = Math.min(at(placed, place), most);
    most = at(placed, place) - gap;
  }
}

function at(list: number[], index: number): number {
  return list[index] ?? 0;
}
