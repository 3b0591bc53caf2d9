import * as fontkit from "fontkit";

// Asked for at run time: a bundler that sees this call answers it itself, and font files are no modules of its own.
const { createRequire } = process.getBuiltinModule("node:module");
const { resolve } = createRequire(import.meta.url);

/** What a caller asks for. Each face is a chain of fonts: a character that the first lacks is taken from the next. */
export type Face = "serif" | "serif-bold" | "serif-italic" | "sans" | "sans-bold";

const sans = "dejavu-fonts-ttf/ttf/DejaVuSans.ttf";
const sansBold = "dejavu-fonts-ttf/ttf/DejaVuSans-Bold.ttf";

/** The later fonts of each chain cover Latin, Greek, Cyrillic and Vietnamese, so that every such name prints. */
const files: Record<Face, readonly string[]> = {
  serif: [
    "@expo-google-fonts/literata/400Regular/Literata_400Regular.ttf",
    "dejavu-fonts-ttf/ttf/DejaVuSerif.ttf",
  ],
  "serif-bold": [
    "@expo-google-fonts/literata/600SemiBold/Literata_600SemiBold.ttf",
    "dejavu-fonts-ttf/ttf/DejaVuSerif-Bold.ttf",
    sansBold,
  ],
  "serif-italic": [
    "@expo-google-fonts/literata/400Regular_Italic/Literata_400Regular_Italic.ttf",
    "dejavu-fonts-ttf/ttf/DejaVuSerif-Italic.ttf",
    sans,
  ],
  sans: [
    "@expo-google-fonts/atkinson-hyperlegible-next/400Regular/AtkinsonHyperlegibleNext_400Regular.ttf",
    sans,
  ],
  "sans-bold": [
    "@expo-google-fonts/atkinson-hyperlegible-next/700Bold/AtkinsonHyperlegibleNext_700Bold.ttf",
    sansBold,
  ],
};

interface Font {
  readonly path: string;
  readonly covers: (codePoint: number) => boolean;
}

const opened = new Map<string, Font>();

function open(file: string): Font {
  const known = opened.get(file);
  if (known) return known;
  const path = resolve(file);
  const font = fontkit.openSync(path);
  if (!("hasGlyphForCodePoint" in font)) throw new Error(`${file} is a collection of fonts, not one font`);
  const made = { path, covers: (codePoint: number) => font.hasGlyphForCodePoint(codePoint) };
  opened.set(file, made);
  return made;
}

/** The font files of a face, first choice first. */
export function fontsOf(face: Face): readonly Font[] {
  return files[face].map(open);
}
