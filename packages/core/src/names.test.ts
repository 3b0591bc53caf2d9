import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { foldName, initialsOf } from "./names";

describe("a name as it is compared", () => {
  it.each([
    ["Łukaszewska", "lukaszewska"],
    ["ŁUKASZEWSKA", "lukaszewska"],
    ["Brânză", "branza"],
    ["Siân", "sian"],
    ["Jürgen Weiß", "jurgen weiss"],
    ["WEISS", "weiss"],
    ["Ærøskøbing", "aeroskobing"],
    ["Œuvrard", "oeuvrard"],
    ["Þórður", "thordur"],
    ["Đorđević", "dordevic"],
    ["Işık", "isik"],
    ["İSMET", "ismet"],
    ["Anne-Marie", "anne marie"],
    ["Anne\u2011Marie", "anne marie"],
    ["  de  la   Cruz ", "de la cruz"],
    ["Smith, John (Jack)", "smith john jack"],
    ["Ελένη", "ελενη"],
    ["山田", "山田"],
    ["Ward 2", "ward 2"],
    ["--", ""],
    ["", ""],
  ])("%s is %s", (name, folded) => expect(foldName(name)).toBe(folded));

  // Typewriter, both typographic marks, the letter that Unicode names an apostrophe, and two keys beside it.
  it.each(["'", "\u2019", "\u2018", "\u02BC", "`", "\u00B4"])("the apostrophe %s is forgiven", (mark) => {
    expect(foldName(`O${mark}Hare`)).toBe("ohare");
  });
});

describe("for any name", () => {
  const names = fc.oneof(fc.string({ unit: "grapheme" }), fc.stringMatching(/^[A-Za-zÀ-ÖØ-öø-ž' -]{1,30}$/));

  it("folding once is enough", () => {
    fc.assert(
      fc.property(names, (name) => {
        expect(foldName(foldName(name))).toBe(foldName(name));
      }),
    );
  });

  it("an accent written as one sign or as two is the same", () => {
    fc.assert(
      fc.property(names, (name) => {
        const folded = foldName(name);
        expect(foldName(name.normalize("NFD"))).toBe(folded);
        expect(foldName(name.normalize("NFC"))).toBe(folded);
      }),
    );
  });

  it("every Latin letter of Europe is the same small and large", () => {
    // Without the signs for times and divided by, and without one letter that Unicode has given up.
    const codes = Array.from({ length: 0x17e - 0xc0 + 1 }, (_, n) => 0xc0 + n);
    for (const letter of codes.map((code) => String.fromCodePoint(code)).filter((c) => !/[×÷ŉ]/.test(c))) {
      expect(foldName(letter.toUpperCase())).toBe(foldName(letter));
      expect(foldName(letter.toLowerCase())).toBe(foldName(letter));
      expect(foldName(letter)).toMatch(/^\p{Ll}{1,2}$/u);
    }
  });

  it("only letters, figures and single spaces between them are left", () => {
    fc.assert(
      fc.property(names, (name) => {
        expect(foldName(name)).toMatch(/^(?:[\p{L}\p{N}]+(?: [\p{L}\p{N}]+)*)?$/u);
      }),
    );
  });
});

describe("initials", () => {
  it.each([
    ["Perran", "Oake", "P. O."],
    ["élodie", "van der Berg", "É. V."],
    ["ángel", "", "Á."],
    ["", "", ""],
    ["  Siân ", " ŵyn", "S. Ŵ."],
  ])("of %j %j are %j", (given, family, initials) => expect(initialsOf(given, family)).toBe(initials));
});
