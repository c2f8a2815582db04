import { type Showing } from '#nights';
import { type EventView } from './eventView';
import { plannedShowings } from './plannedShowings';

const at = (time: string): number => Date.parse(`2027-02-06T${time}:00Z`);

const showing: Showing = {
  target: 'Jupiter',
  shown: true,
  minutes: 90,
  intervals: [
    { startMs: at('18:00'), endMs: at('19:00') },
    { startMs: at('20:00'), endMs: at('20:30') },
  ],
  best: { utcMs: at('18:10'), altitudeDeg: 41, azimuthDeg: 134, skyBrightness: 20.9, margin: 9 },
  why: '',
  range: null,
};

function planned(startsAt: string, endsAt: string, showings: readonly Showing[] = [showing]) {
  const event = {
    startsAt: `2027-02-06T${startsAt}:00Z`,
    endsAt: `2027-02-06T${endsAt}:00Z`,
    evening: { showings },
  };
  return plannedShowings(event as unknown as EventView);
}

it('keeps what lies inside the hours', () => {
  expect(planned('17:00', '21:00')).toEqual([showing]);
});

it('cuts what the hours cut, and drops a best moment outside them', () => {
  expect(planned('18:30', '20:10')).toEqual([
    {
      ...showing,
      intervals: [
        { startMs: at('18:30'), endMs: at('19:00') },
        { startMs: at('20:00'), endMs: at('20:10') },
      ],
      minutes: 40,
      best: null,
    },
  ]);
});

it('leaves out what is over before, and what was not shown at all', () => {
  expect(planned('20:30', '21:00')).toEqual([]);
  expect(planned('17:00', '21:00', [{ ...showing, shown: false }])).toEqual([]);
});
