import { changeView, FIRST_ROOM, FIRST_VIEW, fittedSize, neighbour, roomReducer, type View, viewWords, windowFunction } from './room-state';

const view = (changes: Partial<View>): View => ({ ...FIRST_VIEW, ...changes });

describe('zoom', () => {
  test('keeps the point under the pointer where it is', () => {
    // the picture's point at the pointer is (pointer - place) / scale, before and after
    const before = view({ scale: 2, x: 0.2, y: -0.1 });
    const after = changeView(before, { type: 'zoom', factor: 1.5, x: 0.3, y: 0.25 });
    expect(after.scale).toBeCloseTo(3);
    expect((0.3 - after.x) / after.scale).toBeCloseTo((0.3 - before.x) / before.scale);
    expect((0.25 - after.y) / after.scale).toBeCloseTo((0.25 - before.y) / before.scale);
  });

  test('never goes below the fitted size, where the picture stands in the middle', () => {
    expect(changeView(view({ scale: 1.4, x: 0.5, y: 0.5 }), { type: 'zoom', factor: 0.1 })).toEqual(FIRST_VIEW);
  });

  test('has an upper end', () => {
    let zoomed = FIRST_VIEW;
    for (let step = 0; step < 50; step++) zoomed = changeView(zoomed, { type: 'zoom', factor: 2 });
    expect(zoomed.scale).toBeLessThanOrEqual(32);
    expect(Number.isFinite(zoomed.x)).toBe(true);
  });
});

describe('moving', () => {
  test('stops where the picture would leave the middle of its place', () => {
    expect(changeView(view({ scale: 4 }), { type: 'pan', x: 99, y: -99 })).toMatchObject({ x: 2, y: -2 });
  });
  test('does nothing at the fitted size', () => {
    expect(changeView(FIRST_VIEW, { type: 'pan', x: 0.3, y: 0.3 })).toEqual(FIRST_VIEW);
  });
});

describe('turning and mirroring', () => {
  test('four turns come back', () => {
    let turned = FIRST_VIEW;
    for (const expected of [1, 2, 3, 0]) {
      turned = changeView(turned, { type: 'turn', by: 1 });
      expect(turned.turns).toBe(expected);
    }
    expect(changeView(FIRST_VIEW, { type: 'turn', by: -1 }).turns).toBe(3);
  });
  test('mirroring twice comes back, and keeps the same part in sight', () => {
    const once = changeView(view({ scale: 3, x: 0.8 }), { type: 'mirror' });
    expect(once).toMatchObject({ isMirrored: true, x: -0.8 });
    expect(changeView(once, { type: 'mirror' })).toEqual(view({ scale: 3, x: 0.8 }));
  });
});

describe('the window of grey values', () => {
  // DICOM PS3.3, C.11.2.1.3.2 (LINEAR_EXACT), written out with the output from 0 to 1
  const byStandard = (x: number, c: number, w: number) => (x <= c - w / 2 ? 0 : x > c + w / 2 ? 1 : (x - c) / w + 0.5);
  const byFilter = (x: number, of: Parameters<typeof windowFunction>[0]) => {
    const { slope, intercept } = windowFunction(of);
    return Math.min(1, Math.max(0, slope * x + intercept));
  };

  test.each([[50, 100], [30, 40], [70, 10], [10, 150], [100, 2]])('level %d %%, width %d %% follows the standard', (level, width) => {
    for (let step = 0; step <= 20; step++) {
      const x = step / 20;
      expect(byFilter(x, { level, width, isInverted: false })).toBeCloseTo(byStandard(x, level / 100, width / 100), 9);
      expect(byFilter(x, { level, width, isInverted: true })).toBeCloseTo(1 - byStandard(x, level / 100, width / 100), 9);
    }
  });

  test('changes nothing at the beginning', () => {
    expect(windowFunction(FIRST_VIEW)).toEqual({ slope: 1, intercept: 0 });
  });

  test('stays within its bounds', () => {
    expect(changeView(FIRST_VIEW, { type: 'window-by', level: -80, width: -200 })).toMatchObject({ level: 0, width: 2 });
    expect(changeView(FIRST_VIEW, { type: 'window', width: 900 })).toMatchObject({ level: 50, width: 200 });
  });
});

describe('the room', () => {
  test('changes only the panes that are named, and remembers the others', () => {
    let room = roomReducer(FIRST_ROOM, { type: 'zoom', factor: 2, panes: ['0 a'] });
    room = roomReducer(room, { type: 'invert', panes: ['0 b'] });
    expect(room.views['0 a']).toMatchObject({ scale: 2, isInverted: false });
    expect(room.views['0 b']).toMatchObject({ scale: 1, isInverted: true });
  });
  test('changes both panes when they are linked', () => {
    const room = roomReducer(FIRST_ROOM, { type: 'zoom', factor: 3, panes: ['0 a', '1 b'] });
    expect([room.views['0 a']!.scale, room.views['1 b']!.scale]).toEqual([3, 3]);
  });
  test('reset puts everything of the picture back', () => {
    let room = roomReducer(FIRST_ROOM, { type: 'zoom', factor: 3, panes: ['0 a'] });
    room = roomReducer(room, { type: 'mirror', panes: ['0 a'] });
    room = roomReducer(room, { type: 'window-by', level: 10, width: -30, panes: ['0 a'] });
    expect(roomReducer(room, { type: 'reset', panes: ['0 a'] }).views['0 a']).toEqual(FIRST_VIEW);
  });
  test('keeps its tool, its active pane and its link apart from the pictures', () => {
    const room = [{ type: 'tool', tool: 'window' }, { type: 'activate', pane: 1 }, { type: 'link' }] as const;
    expect(room.reduce(roomReducer, FIRST_ROOM)).toEqual({ views: {}, tool: 'window', active: 1, isLinked: true });
  });
});

test('a picture fits its place, turned too', () => {
  const image = { width: 3000, height: 1500 };
  expect(fittedSize(image, { width: 600, height: 600 }, 0)).toEqual({ width: 600, height: 300 });
  expect(fittedSize(image, { width: 600, height: 600 }, 1)).toEqual({ width: 300, height: 600 });
});

test('the neighbour of a picture is none at either end', () => {
  expect(neighbour(['a', 'b'], 'a', 1)).toBe('b');
  expect(neighbour(['a', 'b'], 'b', 1)).toBeNull();
  expect(neighbour(['a', 'b'], 'a', -1)).toBeNull();
});

test('what is done to a picture is told in words', () => {
  expect(viewWords(FIRST_VIEW)).toBe('Zoom 100\u00a0%');
  expect(viewWords(view({ scale: 1.5, isInverted: true, turns: 1, isMirrored: true }))).toBe('Zoom 150\u00a0%, inverted, turned 90°, mirrored');
});
