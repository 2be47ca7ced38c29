/**
 * The words by which a cable is found. `cableWords` writes the search text stored beside each entry; `searchWord` brings
 * a typed word to the same spelling. Pure; the reading of a whole search is `read-search.ts`.
 */
import type { Build, Family } from "@/lib/cables/schema";

/** Other names of the trade for one thing -> the spelling kept in the index. */
const synonyms: Record<string, string> = {
  shielded: "screened",
  shield: "screened",
  screen: "screened",
  unshielded: "unscreened",
  coax: "coaxial",
  coaxials: "coaxial",
  twinax: "twinaxial",
  pairs: "pair",
  polyethylene: "pe",
  polythene: "pe",
  foamed: "foam",
  cellular: "foam",
  expanded: "foam",
  braided: "braid",
  foiled: "foil",
  strand: "stranded",
  strands: "stranded",
  sheath: "jacket",
  jumper: "patch",
  jumpers: "patch",
  tail: "patch",
  feeders: "feeder",
  cu: "copper",
  ag: "silver",
  silvered: "silver",
  halogenfree: "lszh",
  lszh0: "lszh",
  airspaced: "airspaced",
  semirigid: "semirigid",
};

/** One word as the index spells it: lower case, letters and digits only, synonyms replaced. */
export function searchWord(typed: string): string {
  const bare = typed
    .normalize("NFKD")
    .toLowerCase()
    .replace(/[Ωω\u2126]/g, "ohm")
    .replace(/[^\p{L}\p{N}]/gu, "");
  return Object.hasOwn(synonyms, bare) ? (synonyms[bare] ?? bare) : bare;
}

/** Words of a text: each part alone and each hyphenated compound joined, so that "low-loss" answers to low, loss, lowloss. */
function wordsOf(text: string): string[] {
  const spelled = text.replace(/(\d)\s*Ω/g, "$1ohm").replace(/(\d)\s+(mm|ohm)\b/g, "$1$2");
  return spelled
    .split(/[\s,;()]+/)
    .flatMap((compound) => [compound, ...compound.split(/[-/+.]/)])
    .map(searchWord)
    .filter((word) => word.length > 0);
}

const familyWords: Record<Family, string> = {
  coaxial: "coaxial coax",
  twistedPair: "twisted pair twistedpair",
  twinaxial: "twinaxial pair",
};

const screenWords: Record<Build["screen"][number], string> = {
  foil: "foil",
  braid: "braid",
  doubleBraid: "double braid doublebraid",
  strip: "strip",
  tube: "tube semirigid",
  corrugated: "corrugated",
  drain: "drain",
};

interface Described {
  designation: string;
  aliases: string[];
  name: string;
  family: Family;
  build: Build | null;
}

/** Every word a cable answers to, once each, separated by spaces. */
export function cableWords(cable: Described): string {
  const { build } = cable;
  const built = build
    ? [
        build.conductor,
        build.isStranded ? "stranded" : "solid",
        build.dielectricName,
        build.dielectric === "airSpaced" ? "air-spaced" : build.dielectric,
        build.screenName,
        ...build.screen.map((layer) => screenWords[layer]),
        build.screen.length > 0 ? "screened" : "unscreened",
        build.jacket ?? "",
        build.pairCount > 1 ? `${build.pairCount}-pair` : "",
      ]
    : [];
  const texts = [cable.designation, ...cable.aliases, cable.name, familyWords[cable.family], ...built];
  return [...new Set(texts.flatMap(wordsOf))].join(" ");
}
