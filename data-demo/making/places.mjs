// The invented town: quarters, their ground, streets, and what stands in them. Every name is made up.
// tier 0 = harbour fill, 1 = terraces, 2 = ridge. turn = [cos, sin] of a Pythagorean triangle, so that no trigonometry is needed.

const flat = [1, 0];
const left = [144 / 145, 17 / 145];
const right = [220 / 221, -21 / 221];

export const quarters = [
  { name: 'Tallow Quay', tier: 0, ground: 'fill', turn: flat, streets: ['Tallow Steps', 'Capstan Lane'],
    stock: { oldWarehouse: 6, shopHouse: 5, oldFlats: 3, newFlats: 3, inn: 2, offices: 1, cottages: 1 } },
  { name: 'Ropewalk Fill', tier: 0, ground: 'fill', turn: right, streets: ['Oakum Street', 'Hawser Road'],
    stock: { oldWarehouse: 4, newWarehouse: 4, works: 5, midFlats: 3, carDeck: 1, midOffices: 2, yard: 1 } },
  { name: 'Lantern Dock', tier: 0, ground: 'fill', turn: left, streets: ['Lantern Front', 'Bollard Street'],
    stock: { tower: 2, newOffices: 5, newFlats: 5, inn: 2, carDeck: 2, store: 2, oldWarehouse: 2, ferryHall: 1 } },
  { name: 'Gannet Basin', tier: 0, ground: 'fill', turn: flat, streets: ['Basin Road', 'Slipway Street'],
    stock: { newWarehouse: 6, works: 7, store: 2, midOffices: 2, rescue: 1, yard: 1 } },
  { name: 'Netmender Rows', tier: 1, ground: 'firm terrace', turn: right, streets: ['Netmender Street', 'Bobbin Row'],
    stock: { terraceHouse: 15, shopHouse: 4, timberHouse: 3, chapel: 1 } },
  { name: 'Chandlers Terrace', tier: 1, ground: 'firm terrace', turn: flat, streets: ['Chandler Parade', 'Tinder Street'],
    stock: { shopHouse: 6, midFlats: 5, midOffices: 4, oldFlats: 3, newOffices: 2, civicHall: 1, store: 1 } },
  { name: 'Saltmarsh College West', tier: 1, ground: 'firm terrace', turn: flat, streets: ['Founders Walk', 'Sedge Path'],
    stock: { oldTeaching: 4, teaching: 4, science: 2, residence: 2, readingRoom: 1, civicHall: 1 } },
  { name: 'Saltmarsh College East', tier: 1, ground: 'firm terrace', turn: left, streets: ['Sedge Path', 'Plover Road'],
    stock: { teaching: 4, newScience: 4, residence: 4, newTeaching: 2, carDeck: 1, sportsHall: 1 } },
  { name: 'Marram Terrace', tier: 1, ground: 'firm terrace', turn: left, streets: ['Marram Street', 'Tern Row'],
    stock: { terraceHouse: 6, midFlats: 6, timberHouse: 4, newFlats: 2, school: 1, store: 1 } },
  { name: 'Cistern Hill', tier: 2, ground: 'ridge rock', turn: right, streets: ['Cistern Road', 'Pump Lane'],
    stock: { timberHouse: 8, midFlats: 4, clinic: 3, oldFlats: 2, newOffices: 1 } },
  { name: 'Signal Ridge', tier: 2, ground: 'ridge rock', turn: flat, streets: ['Signal Road', 'Halyard Street'],
    stock: { newFlats: 5, timberHouse: 7, midOffices: 3, rescue: 1, inn: 1, terraceHouse: 2 } },
  { name: 'Whinbrow', tier: 2, ground: 'ridge rock', turn: left, streets: ['Whin Avenue', 'Thrift Lane'],
    stock: { timberHouse: 9, cottages: 2, school: 1, chapel: 1, midFlats: 2, store: 1, yard: 1 } },
];

export const properNames = {
  oldWarehouse: ['Cordage Store', 'Salt Store', 'Blubber House', 'Hemp Loft', 'Barrel Store', 'Kelp Store', 'Anchor Loft', 'Twine Store', 'Sailcloth Loft', 'Cod Store', 'Pitch Store', 'Spar Loft'],
  newWarehouse: ['Cold Store', 'Transit Shed', 'Crate Hall', 'Pallet Shed', 'Bonded Shed', 'Fuel Store', 'Parcel Shed', 'Ice Shed', 'Dry Store', 'Container Shed'],
  works: ['Boiler Works', 'Propeller Works', 'Net Works', 'Boat Shed', 'Pump Works', 'Ice Works', 'Cannery', 'Smokehouse', 'Engine Shop', 'Rigging Shop', 'Galvanising Works', 'Joinery'],
  inn: ['The Lamplighter', 'Gull and Anchor', 'Bramling Inn', 'Fathom House', 'Tidewater Rooms'],
  newOffices: ['Fulmar House', 'Meridian Quay', 'Petrel Court', 'Customs Court', 'Curlew House', 'Dunlin House', 'Sextant Place'],
  midOffices: ['Harbour Board Offices', 'Assay House', 'Pilots House', 'Insurance Chambers', 'Tide Office', 'Ledger House', 'Telegraph House', 'Quarter House', 'Survey House', 'Cable House', 'Weigh House'],
  offices: ['Registry of Wrecks'], tower: ['Bowline Tower', 'Kittiwake Tower'],
  ferryHall: ['Ferry Hall'], rescue: ['Basin Rescue Station', 'Ridge Fire House'], chapel: ["Netmenders' Chapel", 'Chapel of the Whin'],
  civicHall: ['Chandlers Assembly Rooms', 'Great Hall of the College'], school: ['Marram School', 'Whinbrow School'],
  clinic: ['Cistern Hill Infirmary', 'Lying-in House', 'Eye Clinic'], carDeck: ['Hawser Car Deck', 'Lantern Car Deck', 'Bollard Car Deck', 'Plover Car Deck'],
  store: ['Provision Store', 'Chandlery Market', 'Bread and Lamp Store', 'Basin Stores', 'Paint and Rope Shop', 'Corner Market', 'Hill Grocer'],
  oldTeaching: ['Founders House', 'Mathematics House', 'Old Grammar Range', 'Drawing School'],
  teaching: ['Sedge Building', 'Navigation School', 'Languages House', 'Egret Building', 'Economics House', 'Bunting Building', 'Geography House', 'Avocet Building'],
  newTeaching: ['Spoonbill Building', 'Dowitcher Building'], science: ['Chemistry House', 'Physics House'],
  newScience: ['Marine Science Building', 'Wave Tank House', 'Materials House', 'Genetics Building'],
  residence: ['Heron Residence', 'Bittern Residence', 'Sandpiper Residence', 'Redshank Residence', 'Knot Residence', 'Godwit Residence'],
  readingRoom: ['College Reading Room'], sportsHall: ['Sports Hall'],
};
