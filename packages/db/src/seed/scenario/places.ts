/** Streets of Easterhaven and the villages round it. Invented, like everything in this folder. */
export const streets = [
  "Kelp Street",
  "Chandler's Steps",
  "Lamp Lane",
  "Net Loft Row",
  "Tollgate Row",
  "Ropewalk",
  "Sandling Road",
  "Quarry Hill",
  "Bittern Close",
  "Fore Street",
  "Pilchard Court",
  "Dunlin Way",
  "Saltmarsh Road",
  "Mizzen Terrace",
  "Harbour View",
  "Lobster Lane",
  "Thrift Gardens",
  "Beacon Rise",
  "Ferry Lane",
  "Samphire Road",
  "Oystercatcher Drive",
  "Old Lifeboat Row",
  "Gannet Hill",
  "Barley Field",
  "Spindrift Avenue",
  "Capstan Square",
  "Ebb Street",
  "Marram Bank",
] as const;

export const towns = [
  "Easterhaven",
  "Easterhaven",
  "Easterhaven",
  "Little Wharf",
  "Sandling",
  "Tern Bay",
  "Upper Dray",
] as const;

export const surgeries = [
  {
    name: "Quayside Surgery",
    lines: ["2 Lamp Lane", "Easterhaven"],
    postcode: "ZZ4 1AB",
    doctors: ["Dr Hanne Pryor", "Dr Amal Benbow"],
  },
  {
    name: "Lantern Street Surgery",
    lines: ["14 Lantern Street", "Easterhaven"],
    postcode: "ZZ4 3EF",
    doctors: ["Dr Ruth Ellery", "Dr Conor Vale"],
  },
  {
    name: "Sandling Health Centre",
    lines: ["1 Green Way", "Sandling"],
    postcode: "ZZ7 2JK",
    doctors: ["Dr Mira Chaudry-Penn", "Dr Joss Hallam"],
  },
  {
    name: "Tern Bay Practice",
    lines: ["30 Cliff Road", "Tern Bay"],
    postcode: "ZZ8 5LM",
    doctors: ["Dr Odile Farrow"],
  },
] as const;

export const payersOfMarram = [
  {
    name: "Samphire Mutual",
    kind: "insurer",
    lines: ["Samphire House", "40 Quay Parade", "Easterhaven"],
    postcode: "ZZ9 1AA",
    email: "claims@samphire.example",
    days: 30,
  },
  {
    name: "Halyard Mutual",
    kind: "insurer",
    lines: ["7 Capstan Square", "Easterhaven"],
    postcode: "ZZ9 4HM",
    email: "invoices@halyard.example",
    days: 30,
  },
  {
    name: "Easterhaven Port Authority",
    kind: "employer",
    lines: ["The Customs House", "Easterhaven"],
    postcode: "ZZ9 7PA",
    email: "accounts@port.example",
    days: 30,
  },
] as const;
