export { eveningAnswer, type EveningAnswer } from './eveningAnswer';
export { skyAnswer, type SkyAnswer } from './skyAnswer';
export { type ElementsOrigin, fixedTarget, namedTarget, type NamedTarget, orbitTarget } from './namedTarget';
export { compareElements, type ElementShift, elementState, type ElementState } from './elementState';
export { type BodyMotion, bodyMotion } from './bodyMotion';
export { placeShift, type PlaceShift, type ScaleShift, shiftWords } from './placeShift';
export { perturbing, type Perturbing } from './perturbing';
export { programVersion } from '../programVersion';
