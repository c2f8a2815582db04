export { type ElementProblem, type FieldProblem } from './problem';
export { type ElementField, type ElementFormat, type ElementSet, type ObservationRecord } from './elementSet';
export { type CometPrefix, type Designation, type Survey } from './designation';
export { parseDesignation } from './parseDesignation';
export { type GivenElements } from './given';
export { type Completion, completeElements } from './complete';
export { type ElementFrame, type OrbitAngles, readFrame, toEclipticJ2000 } from './frame';
export { type NamedProblem, type NamedValue, readNamedValues } from './namedValues';
export { type ReadTime, readTime } from './readTime';
export { isoTt } from './calendar';
export { orbitClass } from './orbitClass';
export { type ElementReading, readElements } from './readElements';
export { type ElementBatch } from './elementReader';
export {
  collectElements,
  type ElementProgress,
  type ElementStreamOptions,
  readElementStream,
} from './readElementStream';
export { writeCometLine, writeMinorPlanetLine, type WrittenLine } from './mpcWrite';
export { type CheckedSet, toCheckedSet, toCheckJson } from './checkJson';
export { bodyTest, findBody } from './findBody';
