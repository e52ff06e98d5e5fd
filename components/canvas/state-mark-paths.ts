import type { PairState } from '@/shared/estimate/estimate-result';
import { circlePath, halfDiscPath, linesPath, tenth } from './paths';
import type { ScreenPoint } from './viewport';

/** Mark of a pair's state as two paths, one stroked and one filled; the shapes are those of the state mark beside words. */
export function stateMarkPaths(
  state: PairState,
  at: ScreenPoint,
  radius: number,
): { readonly stroked: string; readonly filled: string } {
  switch (state) {
    case 'clear':
      return { stroked: circlePath(at, radius), filled: '' };
    case 'tight':
      return { stroked: circlePath(at, radius), filled: halfDiscPath(at, radius) };
    case 'lacking':
      return { stroked: circlePath(at, radius), filled: circlePath(at, radius) };
    case 'not held': {
      const r = radius * 1.15;
      const [x, y] = [tenth(at.x), tenth(at.y)];
      return {
        stroked: `M${x} ${tenth(y - r)}L${tenth(x + r)} ${y}L${x} ${tenth(y + r)}L${tenth(x - r)} ${y}Z`,
        filled: '',
      };
    }
    case 'never together': {
      const apart = radius * 0.55;
      const bar = (x: number) => ({ x1: x, y1: at.y - radius, x2: x, y2: at.y + radius });
      return { stroked: linesPath([bar(at.x - apart), bar(at.x + apart)]), filled: '' };
    }
  }
}
