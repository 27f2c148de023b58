/* One thread of the plant: evaluates its share and tells of every hundredth basis. */
import { parentPort, workerData } from 'node:worker_threads';
import { workPlant } from './plant';

const { from, to } = workerData as { from: number; to: number };
const { seconds } = workPlant(from, to, () => parentPort?.postMessage('one'));
parentPort?.postMessage(seconds);
