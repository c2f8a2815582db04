export { type BodyTrust, bodyTrust, type FieldShare, type TrustedBody, type TrustFields } from './bodyTrust';
export { observedArc, type ObservedArc } from './observedArc';
export { type ErrorPart, expectedPlaceError, type OrbitStanding, type PlaceError } from './placeError';
export { eventTrust, targetTrust, TrustInput, trustOfEvent } from './targetTrust';
