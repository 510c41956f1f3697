// The mistakes of a real file, put in on purpose. Each returns nothing and notes what it did to which row.

const isPlain = (row) => row.Use !== 'open yard' && row['Stiffness along (kN/m)'] === '' && row.dirty !== true;

/** Spoils rows in place. Returns notes [{row, column, what}], matched by identity, so later insertion moves no note, and the set of all rows it looked after. */
export function addDirt(random, entries) {
  const notes = [];
  const rows = entries.map((entry) => entry.row);
  const lotOf = new Map(entries.map((entry) => [entry.row, entry.lot]));
  const touched = new Set();
  const take = (count, test) => {
    const chosen = random.shuffle(rows.filter((row) => isPlain(row) && !touched.has(row) && test(row, lotOf.get(row)))).slice(0, count);
    if (chosen.length < count) throw new Error(`dirt: only ${chosen.length} of ${count} rows found`);
    for (const row of chosen) touched.add(row);
    return chosen.sort((a, b) => rows.indexOf(a) - rows.indexOf(b));
  };
  const spoil = (row, column, value, what) => {
    row[column] = value;
    notes.push({ row, column, what });
  };
  const each = (count, test, column, value, what) => {
    for (const row of take(count, test)) {
      const given = typeof value === 'function' ? value(row, lotOf.get(row)) : value;
      spoil(row, column, given, typeof what === 'function' ? what(row, given) : what);
    }
  };
  const feet = (lot) => (lot.height / 0.3048).toFixed(1);
  const has = (...columns) => (row) => columns.every((column) => row[column] !== '' && row[column] !== '0');

  for (const row of take(12, (r, lot) => has('Storeys', 'Height (m)')(r) && lot.height / lot.storeys > 3.08 && lot.height / lot.storeys < 3.92 && lot.storeys >= 2)) spoil(row, 'Height (m)', feet(lotOf.get(row)), 'feet in the metre column, no suffix');
  each(5, has('Height (m)'), 'Height (m)', (row) => `${row['Height (m)']} m`, 'unit suffix m');
  each(3, has('Height (m)'), 'Height (m)', (_, lot) => `${Math.round(lot.height / 0.3048)} ft`, 'unit suffix ft');
  each(2, has('Floor area (m2)'), 'Floor area (m2)', (row) => `${row['Floor area (m2)']} m2`, 'unit suffix m2');
  each(1, (r, lot) => has('Storeys', 'Height (m)')(r) && lot.storeys === 3, 'Height (m)', '41.5', 'height contradicts 3 storeys');
  each(1, (r, lot) => has('Storeys', 'Height (m)')(r) && lot.storeys === 3, 'Storeys', '9', 'storeys contradict the height (truly 3)');
  each(3, has('Storeys', 'Basements', 'All levels'), 'All levels', (_, lot) => `${lot.storeys + lot.basements + 1}`, 'above + below is not the total');
  each(1, (r, lot) => lot.year > 1955 && lot.year < 1980 && has('Built')(r) && lot.strengthened === undefined, 'Strengthened', (_, lot) => `${lot.year - 17}`, 'strengthened before it was built');
  each(3, () => true, 'Built', '0', 'year 0');
  each(1, (_, lot) => lot.year < 1925, 'Built', 'c. 1910', 'year in words');
  each(1, (_, lot) => lot.kind === 'chapel', 'Storeys', '99', '99 storeys typed as a code for "none"');
  each(1, has('Floor area (m2)'), 'Floor area (m2)', '-1,240', 'negative area');
  each(1, (r, lot) => has('Floor area (m2)', 'Storeys')(r) && lot.storeys === 4, 'Floor area (m2)', '88', 'area too small for its storeys (22 m2 a floor)');
  each(3, (_, lot) => lot.kind === 'timberHouse' && lot.storeys === 2, 'Storeys', '2.5', 'half storey (attic)');
  each(1, (_, lot) => lot.kind === 'residence', 'Houses in row', '3', 'campus row standing for 3 buildings');
  each(1, (r, lot) => lot.kind === 'midFlats', 'Structure', 'lift slab', 'word for the structure that the study does not know');
  each(1, () => true, 'Structure', 'unknown', 'our own word "unknown" in the file');
  each(1, (_, lot) => lot.kind === 'timberHouse', 'Building', '=1+1 Quay Cottages', 'name beginning with =');
  each(1, () => true, 'Remarks', '=SUM(A1:A9)', 'remark beginning with =');
  each(1, () => true, 'Remarks', '@estates: check the roof', 'remark beginning with @');
  each(1, (_, lot) => lot.kind === 'shopHouse', 'Building', '</script><img src=x onerror=alert(1)>', 'name made of markup');
  each(1, (_, lot) => lot.kind === 'terraceHouse', 'Building', 'Almshouses\n(rear range)', 'line break inside a quoted name');
  each(1, (_, lot) => lot.kind === 'inn', 'Building', 'Café Ångström', 'accents');
  each(1, (_, lot) => lot.kind === 'shopHouse', 'Building', 'Señora Núñez, ship’s chandler', 'accents, comma, curly apostrophe');
  each(1, (_, lot) => lot.kind === 'works', 'Building', 'The "Long Shed", Slipway Street', 'quotes and comma');
  for (const row of take(1, () => true)) {
    [row.Lon, row.Lat, row.Outline] = [row.Lat, row.Lon, ''];
    notes.push({ row, column: 'Lon, Lat', what: 'longitude and latitude swapped, outline blank' });
  }
  for (const row of take(1, () => true)) {
    [row.Lon, row.Lat, row.Outline] = ['0', '0', ''];
    notes.push({ row, column: 'Lon, Lat', what: 'coordinates 0, 0, outline blank' });
  }
  for (const row of take(2, (_, lot) => lot.kind !== 'wing')) {
    for (const column of ['Storeys', 'Height (m)', 'All levels', 'Floor area (m2)', 'Structure', 'Built']) row[column] = '';
    notes.push({ row, column: 'Storeys, Height (m), Floor area (m2), Structure, Built', what: 'nothing known but the place and the use' });
  }
  const [twin] = take(1, (_, lot) => lot.kind === 'oldFlats');
  const copy = { ...twin };
  touched.add(copy);
  lotOf.set(copy, lotOf.get(twin));
  rows.splice(rows.indexOf(twin) + 9, 0, copy);
  notes.push({ row: copy, column: 'all', what: `exact duplicate of asset ${twin['Asset no.']}` });
  const [reused] = take(1, (r, lot) => lot.kind === 'timberHouse' && has('Storeys')(r));
  const other = { ...reused, Building: `${reused.Building} (annexe)`, Storeys: '1', 'Height (m)': '3.4', 'All levels': '', 'Floor area (m2)': '54', Outline: '', Built: '1998' };
  touched.add(other);
  lotOf.set(other, lotOf.get(reused));
  rows.splice(rows.indexOf(reused) + 4, 0, other);
  notes.push({ row: other, column: 'Asset no.', what: `id ${reused['Asset no.']} used a second time with other content` });
  const [nameless] = take(1, (_, lot) => lot.kind === 'works');
  spoil(nameless, 'Asset no.', '', 'no id');
  return { rows, notes, touched, loneLineFeeds: take(3, () => true) };
}
