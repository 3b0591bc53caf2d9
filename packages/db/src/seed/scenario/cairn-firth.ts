import type { PracticePlan } from "./practice-plan";

const weekdays = [1, 2, 3, 4, 5] as const;
const breaks = [{ startsAt: "12:30", endsAt: "13:15", label: "Lunch" }];

/** A second, smaller practice on the same installation. It exists so that separation can be seen. */
export const cairnFirth: PracticePlan = {
  name: "Cairn & Firth Clinics",
  legalName: "Cairn and Firth Clinics LLP",
  lines: ["4 Shore Brae", "Firthmouth"],
  postcode: "ZZ20 4CF",
  phone: "+441632960500",
  email: "desk@cairnfirth.example",
  vatNumber: null,
  invoicePrefix: "CF",
  utilisationTarget: 80,
  busyness: 0.7,
  sites: [
    {
      key: "shore",
      name: "Shore Brae",
      lines: ["4 Shore Brae", "Firthmouth"],
      postcode: "ZZ20 4CF",
      phone: "+441632960500",
      isStepFree: true,
      opensAt: "08:30",
      closesAt: "17:30",
      rooms: ["One", "Two"],
    },
  ],
  people: [
    {
      given: "Ewan",
      family: "Strath",
      title: "physiotherapist and owner",
      registration: "PH100301",
      home: "shore",
      roles: [
        ["owner", null],
        ["therapist", null],
      ],
      signIn: "owner@cairnfirth.example",
      work: [{ site: "shore", weekdays, startsAt: "09:00", endsAt: "17:00", breaks }],
    },
    {
      given: "Isla",
      family: "Brae",
      title: "physiotherapist",
      registration: "PH100302",
      home: "shore",
      roles: [["therapist", null]],
      signIn: "isla.brae@cairnfirth.example",
      work: [{ site: "shore", weekdays, startsAt: "08:30", endsAt: "16:30", breaks }],
    },
    {
      given: "Morag",
      family: "Linn",
      title: "receptionist",
      home: "shore",
      roles: [
        ["receptionist", null],
        ["accounts", null],
      ],
      signIn: "desk@cairnfirth.example",
      work: [],
    },
  ],
  services: [
    {
      key: "initial",
      name: "First appointment",
      kind: "initial",
      minutes: 60,
      cleanDown: 0,
      room: "treatment",
      pence: 8_400,
    },
    {
      key: "followUp",
      name: "Return appointment",
      kind: "follow-up",
      minutes: 30,
      cleanDown: 0,
      room: "treatment",
      pence: 5_800,
    },
  ],
  products: [{ name: "Exercise band", pence: 900 }],
  payerDiscount: 0.92,
};
