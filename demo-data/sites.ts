import { type SiteInput } from '#club';

/**
 * Invented sites of an invented region, the Arvenn Marches, laid over a stretch of hills and coast where two
 * time zones meet. Nothing of this name stands there.
 */
export function demoSites(asOf: string): readonly SiteInput[] {
  const year = Number(asOf.slice(0, 4));
  return [
    {
      name: 'Hollin Top',
      latitudeDeg: 42.05,
      longitudeDeg: -7.15,
      elevationM: 910,
      zone: 'Europe/Madrid',
      sky: { magPerArcsec2: 21.65 },
      horizon: skyline([
        [0, 3],
        [45, 2],
        [90, 1.5],
        [150, 1],
        [180, 0.5],
        [225, 1],
        [260, 4],
        [280, 6.5],
        [300, 5],
        [330, 3.5],
      ]),
      domes: [{ azimuthDeg: 285, widthDeg: 50, brighteningMag: 0.7 }],
      gate: { opens: null, closes: '01:30' },
      hazards: 'Uneven turf and guy lines; cattle grid at the gate. Wind chill is severe from October on.',
      emergencyWords:
        'No mobile signal on top: walk to the chapel, 10 minutes down the road. The nearest doctor on call is in Lower Hollin.',
      directions:
        'Forest road from Lower Hollin, the last 3 km unpaved. Park in the clearing on the left, nose out. No mobile signal beyond the chapel.',
    },
    {
      name: 'Quern Field',
      latitudeDeg: 41.62,
      longitudeDeg: -7.62,
      elevationM: 430,
      zone: 'Europe/Lisbon',
      sky: { magPerArcsec2: 21.2 },
      horizon: skyline([
        [0, 6],
        [30, 9],
        [60, 7],
        [95, 4],
        [130, 11],
        [160, 13],
        [185, 12],
        [205, 6],
        [240, 3],
        [285, 4],
        [320, 5],
      ]),
      domes: [{ azimuthDeg: 210, widthDeg: 40, brighteningMag: 0.9 }],
      gate: { opens: '17:30', closes: '23:30' },
      hazards: 'Stubble and a ditch along the east edge; farm traffic until 19:00.',
      emergencyWords:
        'Mobile signal is good. Tell rescuers: Quern Field, the barn with the millstone on the valley road.',
      directions:
        'Turn in at the millstone on the valley road. Park on the stubble east of the barn; the farm dog is friendly and loud.',
    },
    {
      name: 'Saltreach Dunes',
      latitudeDeg: 41.88,
      longitudeDeg: -8.86,
      elevationM: 8,
      zone: 'Europe/Madrid',
      sky: { magPerArcsec2: 20.7 },
      horizon: skyline([
        [0, 2],
        [40, 5],
        [75, 8],
        [110, 9],
        [140, 5],
        [175, 1],
        [200, 0],
        [330, 0],
        [345, 1],
      ]),
      domes: [{ azimuthDeg: 95, widthDeg: 70, brighteningMag: 1.3 }],
      gate: { opens: null, closes: null },
      closures: [
        { from: `${year}-04-01`, to: `${year}-07-15`, why: 'shore birds nest in the dunes' },
        { from: `${year + 1}-04-01`, to: `${year + 1}-07-15`, why: 'shore birds nest in the dunes' },
      ],
      directions:
        'Car park at the end of the boardwalk. Keep to the boards, and check the tide table before you set up on the flat.',
    },
    {
      name: 'Marl Pit',
      latitudeDeg: 42.3,
      longitudeDeg: -7.8,
      elevationM: 540,
      zone: 'Europe/Madrid',
      sky: { bortleClass: 4 },
      horizon: skyline([
        [0, 12],
        [35, 18],
        [70, 21],
        [110, 17],
        [150, 9],
        [175, 6],
        [215, 8],
        [250, 15],
        [290, 22],
        [325, 16],
      ]),
      gate: { opens: '18:00', closes: '00:30' },
      directions:
        'Old quarry above Marl village. The floor is level gravel; stay inside the tape, the north edge drops four metres.',
    },
    {
      name: 'Tamber Park',
      latitudeDeg: 42.33,
      longitudeDeg: -7.87,
      elevationM: 150,
      zone: 'Europe/Madrid',
      sky: { bortleClass: 6 },
      horizon: skyline([
        [0, 10],
        [60, 8],
        [120, 6],
        [180, 9],
        [240, 12],
        [300, 11],
      ]),
      domes: [{ azimuthDeg: 330, widthDeg: 90, brighteningMag: 0.8 }],
      gate: { opens: '16:00', closes: '22:45' },
      directions:
        'The lawn behind the boat house in Tamber. Step-free from the tram stop; lamps are shaded on request.',
    },
  ];
}

function skyline(points: readonly (readonly [azimuthDeg: number, altitudeDeg: number])[]) {
  return points.map(([azimuthDeg, altitudeDeg]) => ({ azimuthDeg, altitudeDeg }));
}
