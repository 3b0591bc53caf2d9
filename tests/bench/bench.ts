import { addDays, dayOf, weekdayOf } from "@withy/core/zoned-time";
import mysql from "mysql2/promise";
import { startBareServer } from "./bare-server";
import { measureStreams, streamCount } from "./live-streams";
import { scriptBytes } from "./page-weight";
import { rowsQuery } from "./rows-query";
import { openSession } from "./signed-in";
import { p50, percentile, type Timed, timeInTurn } from "./timing";
import { large, small, type VolumePlan, volumeId, weeksAhead } from "./volume-plan";

const read = (name: string): string => {
  const value = process.env[name];
  if (!value) throw new Error(`Set ${name}; npm run bench does.`);
  return value;
};

const secret = read("WITHY_SECRET");
const urlOf = (plan: VolumePlan) => read("WITHY_BENCH_URL").replace(/[^/]*$/, plan.database);
const apps = {
  large: read("WITHY_BENCH_LARGE"),
  small: read("WITHY_BENCH_SMALL"),
  blank: read("WITHY_BENCH_BLANK"),
};
const rounds = Number(process.env.WITHY_BENCH_ROUNDS ?? 200);
const siteId = volumeId("site", 0);
const today = dayOf(new Date(), "Europe/London");
const weekday = (day: string): string => (weekdayOf(day) > 5 ? weekday(addDays(day, 1)) : day);
// The last planned week: the only one that is full in both databases.
const lastMonday = addDays(today, 1 - weekdayOf(today) + 7 * weeksAhead);
const busyDay = addDays(lastMonday, 2);

const verdicts: { what: string; figure: string; target: string; isMet: boolean }[] = [];
const judge = (what: string, value: number, most: number, unit: string) =>
  verdicts.push({
    what,
    figure: `${value.toFixed(2)} ${unit}`,
    target: `at most ${most} ${unit}`,
    isMet: value <= most,
  });

const fetchJson = async (url: string, cookie: string) => {
  const answer = await fetch(url, { headers: { cookie } });
  if (!answer.ok) throw new Error(`${url} answered ${answer.status}: ${(await answer.text()).slice(0, 200)}`);
  return answer.json();
};

const say = (timed: Record<string, Timed>) => {
  for (const one of Object.values(timed)) {
    console.log(
      `  ${one.name.padEnd(44)} p50 ${p50(one).toFixed(2).padStart(8)} ms   p95 ${percentile(one.taken, 0.95).toFixed(2).padStart(8)} ms`,
    );
  }
};

const connections = {
  large: await mysql.createConnection({ uri: urlOf(large), timezone: "Z" }),
  small: await mysql.createConnection({ uri: urlOf(small), timezone: "Z" }),
};
const cookies = {
  large: await openSession(connections.large, secret),
  small: await openSession(connections.small, secret),
};
const bare = await startBareServer(urlOf(large), volumeId("practice", 1), [siteId], busyDay);

const day = (size: "large" | "small") =>
  fetchJson(`${apps[size]}/api/diary/day?day=${busyDay}&siteIds=${siteId}`, cookies[size]);
const searchWords: Record<"large" | "small", string[]> = { large: [], small: [] };
for (const size of ["large", "small"] as const) {
  const [rows] = await connections[size].query(
    "SELECT family_name AS name FROM patients WHERE id > ? LIMIT 50",
    [volumeId("patient", size === "large" ? 90_000 : 900)],
  );
  searchWords[size] = (rows as { name: string }[]).map((row) => row.name);
}
const search = (size: "large" | "small", round: number) =>
  fetchJson(
    `${apps[size]}/api/patients?search=${encodeURIComponent(searchWords[size][round % 50] ?? "")}`,
    cookies[size],
  );
const find = (size: "large" | "small") =>
  fetchJson(
    `${apps[size]}/api/diary/times?serviceId=${volumeId("service", 1)}&siteIds=${siteId}&earliestOn=${lastMonday}&latestOn=${addDays(lastMonday, 4)}`,
    cookies[size],
  );

const eightWeeksOn = addDays(today, 56);
const wide = (size: "large" | "small") =>
  fetchJson(
    `${apps[size]}/api/diary/times?serviceId=${volumeId("service", 1)}&latestOn=${eightWeeksOn}`,
    cookies[size],
  );
const bareRows = rowsQuery(today, eightWeeksOn);

console.log(`\nReading, ${rounds} rounds in turn`);
const reading = await timeInTurn(
  {
    "Next, constant JSON": () => fetchJson(`${apps.blank}/constant`, ""),
    "node:http and mysql2, the day's query": () => fetchJson(bare.url, ""),
    "day API, 1,000,000 appointments": () => day("large"),
    "day API, 10,000 appointments": () => day("small"),
    "patient search, 200,000 patients": (round) => search("large", round),
    "patient search, 2,000 patients": (round) => search("small", round),
    "find a time, 1,000,000 appointments": () => find("large"),
    "find a time, 10,000 appointments": () => find("small"),
    "find a time, 12 sites, 8 weeks": () => wide("large"),
    "bare fetch of the rows of those 8 weeks": () => connections.large.query(bareRows),
    "the day of two sites, 25 therapists": () =>
      fetchJson(
        `${apps.large}/api/diary/day?day=${busyDay}&siteIds=${siteId}&siteIds=${volumeId("site", 1)}`,
        cookies.large,
      ),
  },
  rounds,
  30,
);
say(reading);
const at = (name: string) => {
  const timed = reading[name];
  if (!timed) throw new Error(`Nothing was timed as ${name}.`);
  return p50(timed);
};
const yardstick = at("Next, constant JSON") + at("node:http and mysql2, the day's query");
judge("day API against L", at("day API, 1,000,000 appointments") / yardstick, 1.8, "x");
judge(
  "day API, 1,000,000 against 10,000",
  at("day API, 1,000,000 appointments") / at("day API, 10,000 appointments"),
  1.3,
  "x",
);
judge(
  "search, 1,000,000 against 10,000",
  at("patient search, 200,000 patients") / at("patient search, 2,000 patients"),
  1.3,
  "x",
);
judge(
  "find a time, 1,000,000 against 10,000",
  at("find a time, 1,000,000 appointments") / at("find a time, 10,000 appointments"),
  1.3,
  "x",
);

const late = (name: string) => percentile(reading[name]?.taken ?? [], 0.95);
judge("find a time, 12 sites, 8 weeks, p95", late("find a time, 12 sites, 8 weeks"), 150, "ms");
judge(
  "find a time, 12 sites, against the bare fetch",
  at("find a time, 12 sites, 8 weeks") / at("bare fetch of the rows of those 8 weeks"),
  3,
  "x",
);
judge("the day of 25 therapists, p95", late("the day of two sites, 25 therapists"), 30, "ms");

console.log(`\nBooking, ${rounds} rounds in turn, every commit on disk`);
const firstFreeDay = weekday(addDays(today, 80));
const book = async (round: number) => {
  const therapist = round % 150;
  const slot = Math.floor(round / 150);
  const startsAt = `${firstFreeDay}T${String(8 + slot).padStart(2, "0")}:00`;
  const answer = await fetch(`${apps.large}/api/diary/appointments`, {
    method: "POST",
    headers: {
      cookie: cookies.large,
      "content-type": "application/json",
      origin: apps.large,
      "idempotency-key": `bench-${Date.now()}-${round}`,
    },
    body: JSON.stringify({
      patientId: volumeId("patient", round),
      serviceId: volumeId("service", 1),
      therapistId: volumeId("member", therapist),
      siteId: volumeId("site", therapist % large.sites),
      startsAt,
      overrideReason: "Measuring",
    }),
  });
  if (answer.status !== 201)
    throw new Error(`Booking answered ${answer.status}: ${(await answer.text()).slice(0, 300)}`);
};
const insertBare = (round: number) =>
  connections.large.query(
    `INSERT INTO appointments (practice_id, id, site_id, therapist_id, room_id, patient_id, service_id, starts_at, ends_at, state, created_at, created_by, updated_at)
     VALUES (?, UUID(), ?, ?, ?, ?, ?, DATE_ADD(UTC_DATE(), INTERVAL 400 DAY), DATE_ADD(DATE_ADD(UTC_DATE(), INTERVAL 400 DAY), INTERVAL 30 MINUTE), 'cancelled', UTC_TIMESTAMP(3), ?, UTC_TIMESTAMP(3))`,
    [
      volumeId("practice", 1),
      siteId,
      volumeId("member", 0),
      volumeId("room", 0),
      volumeId("patient", round),
      volumeId("service", 1),
      volumeId("member", 0),
    ],
  );
const booking = await timeInTurn(
  { "one bare insert, committed": insertBare, "a booking through the API": book },
  rounds,
  20,
);
say(booking);
const [insertTime, bookTime] = Object.values(booking).map(p50);
judge("booking against a bare committed insert", (bookTime ?? 0) / (insertTime ?? 1), 4, "x");

console.log("\nLive streams open on one process");
const grown = await measureStreams(apps.large, cookies.large, Number(read("WITHY_BENCH_PID")));
console.log(`  ${`memory grown with ${streamCount} streams`.padEnd(44)} ${grown.toFixed(1).padStart(8)} MB`);
judge(`memory of ${streamCount} live streams`, grown, 150, "MB");

console.log("\nScript beyond a blank page, gzipped");
const blank = await scriptBytes(apps.blank, "/", "");
for (const path of [
  "/today",
  "/patients",
  "/patients/new",
  "/notes",
  "/exercises",
  "/letters",
  "/billing",
  "/reports/month",
  "/messages",
  "/settings",
  "/diary",
  "/diary/week",
]) {
  try {
    const beyond = ((await scriptBytes(apps.large, path, cookies.large)) - blank) / 1024;
    console.log(`  ${path.padEnd(44)} ${beyond.toFixed(1).padStart(8)} kB`);
    if (!path.startsWith("/diary")) judge(`script of ${path}`, beyond, 60, "kB");
  } catch (error) {
    console.log(`  ${path.padEnd(44)} ${error instanceof Error ? error.message : "failed"}`);
    verdicts.push({ what: `script of ${path}`, figure: "not served", target: "a page", isMet: false });
  }
}

console.log("\nAgainst the targets");
for (const { what, figure, target, isMet } of verdicts)
  console.log(`  ${isMet ? "met   " : "MISSED"} ${what.padEnd(44)} ${figure.padStart(12)}, ${target}`);
await bare.close();
await Promise.all(Object.values(connections).map((connection) => connection.end()));
process.exitCode = verdicts.every(({ isMet }) => isMet) ? 0 : 1;
