import signs from "@fontsource/stix-two-math/files/stix-two-math-latin-400-normal.woff2?url";
import sansGreek from "@fontsource-variable/source-sans-3/files/source-sans-3-greek-wght-normal.woff2?url";
import sans from "@fontsource-variable/source-sans-3/files/source-sans-3-latin-wght-normal.woff2?url";
import greekItalic from "@fontsource-variable/stix-two-text/files/stix-two-text-greek-wght-italic.woff2?url";
import greek from "@fontsource-variable/stix-two-text/files/stix-two-text-greek-wght-normal.woff2?url";
import latinItalic from "@fontsource-variable/stix-two-text/files/stix-two-text-latin-wght-italic.woff2?url";
import latin from "@fontsource-variable/stix-two-text/files/stix-two-text-latin-wght-normal.woff2?url";

interface Face {
  readonly family: string;
  readonly style: "normal" | "italic";
  readonly url: string;
  /** Embedded only where the figure holds such a letter. */
  readonly needed: RegExp;
}

const greekLetters = /[\u0370-\u03ff]/;
const faces: readonly Face[] = [
  { family: "Source Sans 3", style: "normal", url: sans, needed: /./ },
  { family: "Source Sans 3", style: "normal", url: sansGreek, needed: greekLetters },
  { family: "STIX Two Text", style: "normal", url: latin, needed: /./ },
  { family: "STIX Two Text", style: "italic", url: latinItalic, needed: /./ },
  { family: "STIX Two Text", style: "normal", url: greek, needed: greekLetters },
  { family: "STIX Two Text", style: "italic", url: greekItalic, needed: greekLetters },
  { family: "STIX Two Math", style: "normal", url: signs, needed: /[∂⟨⟩≈≤≥→∝∫√]/ },
];

/** Font rules with the fonts inside, so that a figure looks the same where they are not installed. */
export async function embeddedFonts(text: string): Promise<string> {
  const rules = await Promise.all(
    faces
      .filter(({ needed }) => needed.test(text))
      .map(async ({ family, style, url }) => {
        const data = await fontData(url);
        // Two files of one family and style: without ranges the later would hide the earlier.
        const range = greekRange(url) ? "U+0370-03FF" : "U+0000-036F,U+0400-FFFF";
        return `@font-face{font-family:"${family}";font-style:${style};font-weight:200 900;src:url(${data}) format("woff2");unicode-range:${range}}`;
      }),
  );
  return rules.join("");
}

const greekRange = (url: string) => [sansGreek, greek, greekItalic].includes(url);

const kept = new Map<string, Promise<string>>();

/** A font file as a data address, fetched once. */
function fontData(url: string): Promise<string> {
  const known = kept.get(url);
  if (known) return known;
  const data = fetch(url)
    .then((response) => response.arrayBuffer())
    .then((bytes) => `data:font/woff2;base64,${base64(new Uint8Array(bytes))}`);
  kept.set(url, data);
  // What failed to load may load at the next export.
  data.catch(() => kept.delete(url));
  return data;
}

function base64(bytes: Uint8Array): string {
  let binary = "";
  for (let at = 0; at < bytes.length; at += 0x8000)
    binary += String.fromCharCode(...bytes.subarray(at, at + 0x8000));
  return btoa(binary);
}
