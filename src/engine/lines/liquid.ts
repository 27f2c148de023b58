/* A line full of liquid that does not flash: friction and weight, added from its end to the device. */
import { boreArea } from './segment';
import { type RisingSegment } from './march';

const GRAVITY = 9.80665;

/** Pressure that one segment adds on the way upstream, Pa: N ρ v²/2 + ρ g h. */
export function liquidDrop(segment: RisingSegment, rho: number): number {
  const velocity = segment.W / rho / boreArea(segment.D);
  return (segment.N * rho * velocity ** 2) / 2 + rho * GRAVITY * (segment.rise ?? 0);
}

/** Pressures at the beginning of the segments, Pa absolute, from that beyond the end; velocity heads are not regained. */
export function liquidLine(segments: readonly RisingSegment[], rho: number, end: number): number[] {
  let behind = end;
  return segments
    .toReversed()
    .map((segment) => (behind += liquidDrop(segment, rho)))
    .toReversed();
}
