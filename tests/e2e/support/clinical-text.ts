import type { Page } from "@playwright/test";
import type { EpisodeSummary, EpisodeView, NoteView } from "@withy/contracts/clinical";
import type { PatientPage, TimelineView } from "@withy/contracts/patients";
import { read } from "./desk";

export interface ClinicalText {
  readonly patientIds: readonly string[];
  readonly noteIds: readonly string[];
  /** Passages of notes, reasons and goals, in letters that no encoding changes. */
  readonly passages: readonly string[];
}

const plainRun = /[A-Za-z0-9 ,.;]{18,}/g;

/** What a therapist may read about some patients, for looking out for it where it must not be. */
export async function readClinicalText(page: Page, names: readonly string[]): Promise<ClinicalText> {
  const patientIds = new Set<string>();
  const noteIds = new Set<string>();
  const texts: string[] = [];
  for (const name of names) {
    const found = await read<PatientPage>(page, `/api/patients?${new URLSearchParams({ search: name })}`);
    for (const { id } of found.rows.slice(0, 3)) patientIds.add(id);
  }
  for (const id of patientIds) {
    const notes = await read<TimelineView>(page, `/api/patients/${id}/timeline?kind=notes`);
    for (const entry of notes.entries.slice(0, 6)) noteIds.add(entry.id);
    const episodes = await read<readonly EpisodeSummary[]>(page, `/api/clinical/episodes?patientId=${id}`);
    for (const { id: episodeId } of episodes) {
      const episode = await read<EpisodeView>(page, `/api/clinical/episodes/${episodeId}`);
      texts.push(episode.problem, episode.reason ?? "", ...episode.goals.map((goal) => goal.text));
    }
  }
  for (const id of noteIds) {
    const note = await read<NoteView>(page, `/api/clinical/notes/${id}`);
    texts.push(...Object.values(note.body));
  }
  const passages = new Set(texts.flatMap((text) => text.match(plainRun) ?? []).map((text) => text.trim()));
  return { patientIds: [...patientIds], noteIds: [...noteIds], passages: [...passages] };
}

/** Keeps the body of everything that the server answers to this page, scripts and styles left out. */
export async function keepAnswers(page: Page): Promise<{ url: string; body: string }[]> {
  const kept: { url: string; body: string }[] = [];
  await page.route(
    (url) => !url.pathname.startsWith("/_next/"),
    async (route) => {
      try {
        const response = await route.fetch({ maxRedirects: 0, maxRetries: 3 });
        const body = await response.body();
        kept.push({ url: route.request().url(), body: body.toString("utf8") });
        await route.fulfill({ response, body });
      } catch {
        // A request that the browser gave up on when it went on to another page: no answer reached it.
        await route.abort().catch(() => {});
      }
    },
  );
  return kept;
}
