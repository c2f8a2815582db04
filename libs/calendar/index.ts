export { type CalendarEvent, type CalendarFeed, type CalendarStatus } from './feed';
export { renderCalendar } from './renderCalendar';
export { etagOf, eventUid } from './identity';
export { timeZoneComponent } from './timeZoneComponent';
