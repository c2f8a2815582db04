export { type ChangedShowing, type ChangeNotice, type TouchedEvening } from './changeNotice';
export { type EveningChange, eveningChange, type PlannedEvening, type ShowingChange } from './eveningChange';
export { elementChanges, type BodyChange, eventChanges } from './elementChanges';
