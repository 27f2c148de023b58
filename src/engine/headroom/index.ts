/* The public face of headroom. */
export { type Crossing } from './crossing';
export {
  type Bar,
  curve,
  type CurvePoint,
  headroom,
  type Headroom,
  type InputHeadroom,
  tornado,
  type Tornado,
} from './headroom';
export { type Subject } from './subject';
