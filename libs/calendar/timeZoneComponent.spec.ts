import { timeZoneComponent } from './timeZoneComponent';

const lines = (zone: string, first: string, last: string): string[] =>
  timeZoneComponent(zone, Date.parse(first), Date.parse(last)).split('\r\n');

/** Onset, offset before, offset after and kind of each observance. */
function observances(zone: string, first: string, last: string): string[] {
  return lines(zone, first, last)
    .join('\n')
    .split('BEGIN:')
    .slice(2)
    .map((text) =>
      text
        .match(/(\w+)\nDTSTART:(\w+)\nTZOFFSETFROM:(\S+)\nTZOFFSETTO:(\S+)/)!
        .slice(1)
        .join(' '),
    );
}

it('tells each change of the clocks at the local time that held before it', () => {
  // EU Directive 2000/84/EC: 01:00 UTC on the last Sundays of March and October.
  expect(observances('Europe/Zurich', '2027-03-20T12:00Z', '2027-11-05T12:00Z')).toEqual([
    'DAYLIGHT 20260329T020000 +0100 +0200',
    'STANDARD 20261025T030000 +0200 +0100',
    'DAYLIGHT 20270328T020000 +0100 +0200',
    'STANDARD 20271031T030000 +0200 +0100',
  ]);
});

it('knows that summer falls in January in the south', () => {
  // New Zealand Daylight Time Order 2007: last Sunday of September to first Sunday of April.
  expect(observances('Pacific/Auckland', '2027-01-10T12:00Z', '2027-06-10T12:00Z')).toEqual([
    'STANDARD 20260405T030000 +1300 +1200',
    'DAYLIGHT 20260927T020000 +1200 +1300',
    'STANDARD 20270404T030000 +1300 +1200',
  ]);
});

it('needs a single observance where the clocks never change', () => {
  expect(observances('Asia/Kathmandu', '2027-01-10T12:00Z', '2030-06-10T12:00Z')).toEqual([
    'STANDARD 19700101T000000 +0545 +0545',
  ]);
  expect(observances('America/Phoenix', '2027-01-10T12:00Z', '2027-06-10T12:00Z')).toEqual([
    'STANDARD 19700101T000000 -0700 -0700',
  ]);
});

it('takes half-hour changes', () => {
  // Lord Howe Island moves its clocks by 30 minutes.
  expect(observances('Australia/Lord_Howe', '2027-01-10T12:00Z', '2027-05-10T12:00Z').at(-1)).toBe(
    'STANDARD 20270404T020000 +1100 +1030',
  );
});

it('refuses a zone it does not know', () => {
  expect(() => timeZoneComponent('Europe/Brackenfold', 0, 1)).toThrow('The zone was "Europe/Brackenfold"');
});
