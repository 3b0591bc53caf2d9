import { type ShortcutId, shortcuts } from "./shortcut-table";

export interface KeyTarget {
  areSingleKeysOn(): boolean;
  has(id: ShortcutId): boolean;
  run(id: ShortcutId): void;
}

interface Pressed {
  key: string;
  isTyping: boolean;
  isChord: boolean;
}

const sequenceMs = 1200;

export function pressed(event: KeyboardEvent): Pressed {
  const target = event.target instanceof HTMLElement ? event.target : null;
  const isTyping =
    target !== null && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));
  const mod = event.ctrlKey || event.metaKey;
  const key = event.key === " " ? "space" : event.key.toLowerCase();
  return { key: mod ? `mod+${key}` : key, isTyping, isChord: mod || event.altKey };
}

/**
 * One listener for all shortcuts. Single keys are left alone while someone types, in an open dialog and when they are
 * switched off; chords with Ctrl or Command always work.
 */
export function matchKeys(target: KeyTarget) {
  let first: { key: string; at: number } | null = null;
  return (press: Pressed, event: KeyboardEvent) => {
    if (event.defaultPrevented || event.repeat) return;
    const isInDialog = document.querySelector('.dlg[data-place="centre"], .palette') !== null;
    if (!press.isChord && (press.isTyping || isInDialog || !target.areSingleKeysOn())) return;
    const sequence = first && Date.now() - first.at < sequenceMs ? `${first.key} ${press.key}` : null;
    first = null;
    const hit = shortcuts.find(
      (s) => (s.keys === sequence || s.keys === press.key) && ("href" in s || target.has(s.id)),
    );
    if (hit) {
      event.preventDefault();
      target.run(hit.id);
      return;
    }
    if (shortcuts.some((s) => s.keys.startsWith(`${press.key} `))) first = { key: press.key, at: Date.now() };
  };
}
