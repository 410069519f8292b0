import type { BadgeShape, InstrumentKind } from "#app/domain/repertoire/guitar.ts";
import type { Energy, Priority } from "#app/domain/repertoire/song.ts";

/** The demo act: invented people, songs and places. What a player would type, read by the same code that reads players. */
export const demoAct = "The Emmer Road";

export const demoPeople = [
  { email: "owner@example.test", displayName: "Wren Halloway", role: "owner" },
  { email: "performer@example.test", displayName: "Ivo Tarrant", role: "performer" },
  { email: "tech@example.test", displayName: "Sabe Okell", role: "tech" },
  { email: "guest@example.test", displayName: "Lune Ferrand", role: "guest" },
] as const;

type DemoGuitar = {
  key: string;
  name: string;
  badge: BadgeShape;
  kind: InstrumentKind;
  usual: string;
  keeps: boolean;
  channel: string;
  notes: string;
};

export const demoGuitars: DemoGuitar[] = [
  {
    key: "alder",
    name: "Alder",
    badge: "round",
    kind: "acoustic",
    usual: "standard",
    keeps: false,
    channel: "DI 1",
    notes: "Spruce top, strings 12 to 53.",
  },
  {
    key: "birch",
    name: "Birch",
    badge: "hexagon",
    kind: "acoustic",
    usual: "standard",
    keeps: false,
    channel: "DI 2",
    notes: "Heavier low strings, happy down at C.",
  },
  {
    key: "tin",
    name: "Tin",
    badge: "cut",
    kind: "resonator",
    usual: "open G",
    keeps: true,
    channel: "Mic 3",
    notes: "Slide guitar. Stays in open G all night.",
  },
];

export const demoCapos = [
  { name: "Steel capo", strings: null, count: 1 },
  { name: "Five-string capo", strings: [1, 2, 3, 4, 5], count: 1 },
];

type DemoSong = {
  title: string;
  length: string;
  key: string;
  tempo: number;
  /** Not said of every song, as in a real library. */
  energy?: Energy;
  priority?: Priority;
  /** In order of preference. `capo` as a player writes it. */
  ways: { tuning: string; capo?: string; guitar?: string; penalty?: number }[];
  cover?: number;
  firstLine?: string;
  notes?: string;
};

export const demoSongs: DemoSong[] = [
  {
    title: "Harrow Weather",
    length: "3:40",
    key: "G",
    tempo: 96,
    energy: 3,
    priority: 5,
    ways: [{ tuning: "EADGBE" }],
    firstLine: "The harrow drags the weather in",
  },
  {
    title: "Copper in the Ditch",
    length: "4:05",
    key: "A",
    tempo: 112,
    energy: 4,
    ways: [{ tuning: "EADGBE", capo: "capo 2" }],
  },
  {
    title: "The Ropewalk",
    length: "3:15",
    key: "E",
    tempo: 88,
    energy: 3,
    ways: [{ tuning: "DADGBE", capo: "capo 2" }],
    firstLine: "Nine hundred feet of hemp and tar",
  },
  {
    title: "Ninepenny Field",
    length: "3:55",
    key: "Eb",
    tempo: 76,
    energy: 2,
    ways: [{ tuning: "CGCFFC", capo: "capo 3 leave 6" }],
    cover: 25,
    notes: "Tell the story of the ninepence first.",
  },
  {
    title: "Moth at the Pane",
    length: "3:50",
    key: "G",
    tempo: 104,
    energy: 3,
    priority: 2,
    ways: [{ tuning: "DGDGBD" }],
  },
  {
    title: "Slow Water",
    length: "5:10",
    key: "D",
    tempo: 64,
    energy: 1,
    priority: 4,
    ways: [{ tuning: "DADGAD" }],
    firstLine: "Slow water takes the longest road",
  },
  {
    title: "Brickyard Snow",
    length: "3:30",
    key: "C",
    tempo: 92,
    energy: 3,
    priority: 2,
    ways: [{ tuning: "CGCGCE" }],
  },
  {
    title: "A Kettle for the Watch",
    length: "4:20",
    key: "Fm",
    tempo: 70,
    energy: 2,
    ways: [{ tuning: "CGCFFC" }],
  },
  {
    title: "Signal Box Hymn",
    length: "4:30",
    key: "G",
    tempo: 84,
    energy: 2,
    ways: [{ tuning: "DADGAD", capo: "capo 5" }],
  },
  {
    title: "Elder and Iron",
    length: "4:45",
    key: "E",
    tempo: 120,
    energy: 5,
    priority: 4,
    ways: [{ tuning: "CGCGCE", capo: "capo 4" }],
  },
  {
    title: "Tallow Street",
    length: "4:00",
    key: "Bb",
    tempo: 116,
    energy: 4,
    ways: [{ tuning: "DGDGBD", capo: "capo 3" }],
  },
  {
    title: "The Last Boat Over",
    length: "5:30",
    key: "C",
    tempo: 80,
    energy: 4,
    priority: 5,
    ways: [{ tuning: "EADGBE" }],
    firstLine: "Hold the gate, there is one more",
  },
  {
    title: "Blue Slate",
    length: "3:25",
    key: "D",
    tempo: 100,
    energy: 3,
    priority: 2,
    ways: [{ tuning: "drop D" }],
  },
  {
    title: "Rain on the Chapel Roof",
    length: "4:10",
    key: "G",
    tempo: 90,
    energy: 2,
    ways: [{ tuning: "open G", guitar: "tin" }],
    notes: "Slide throughout.",
  },
  {
    title: "Half a Mile of Hedge",
    length: "3:35",
    key: "D",
    tempo: 108,
    energy: 4,
    priority: 1,
    ways: [{ tuning: "DADGAD" }, { tuning: "drop D", penalty: 6 }],
  },
  {
    title: "Pennyroyal Bend",
    length: "4:15",
    key: "A",
    tempo: 98,
    energy: 3,
    ways: [{ tuning: "EADGBE", capo: "capo 2" }],
  },
  {
    title: "The Weighbridge",
    length: "3:50",
    key: "G",
    tempo: 126,
    energy: 5,
    ways: [{ tuning: "open G", guitar: "tin" }],
  },
  {
    title: "Lanterns Down the Quay",
    length: "4:40",
    key: "C",
    tempo: 72,
    energy: 1,
    ways: [{ tuning: "CGCGCE" }],
  },
  {
    title: "Stonecrop",
    length: "3:20",
    key: "E",
    tempo: 110,
    energy: 4,
    ways: [{ tuning: "DADGAD", capo: "capo 2" }],
  },
  {
    title: "What the River Kept",
    length: "5:05",
    key: "C",
    tempo: 68,
    energy: 2,
    priority: 4,
    ways: [{ tuning: "EADGBE" }],
  },
  {
    title: "Carry the Small Light",
    length: "4:00",
    key: "Eb",
    tempo: 60,
    energy: 1,
    priority: 5,
    ways: [{ tuning: "CGCFFC", capo: "capo 3 leave 6" }],
  },
  {
    title: "Salt on the Step",
    length: "3:45",
    key: "F",
    tempo: 94,
    energy: 3,
    ways: [{ tuning: "EADGBE", capo: "capo 3" }],
  },
  {
    title: "Gannet Point",
    length: "4:25",
    key: "Dm",
    tempo: 78,
    priority: 2,
    ways: [{ tuning: "open D minor" }],
  },
];

type DemoEntry = { title: string; guitar: string; encore?: true };

/** The order as it came to mind, with the guitars as they came to hand: every suggestion has something to gain. */
export const demoGig = {
  name: "The Slipway, spring evening",
  venue: "The Slipway",
  slotMinutes: 125,
  curfew: "23:00",
  localTime: "20:30",
  zone: "Europe/Dublin",
  intervalMinutes: 20,
  sets: [
    [
      { title: "Harrow Weather", guitar: "alder" },
      { title: "Copper in the Ditch", guitar: "alder" },
      { title: "The Ropewalk", guitar: "alder" },
      { title: "Ninepenny Field", guitar: "birch" },
      { title: "Moth at the Pane", guitar: "alder" },
      { title: "Slow Water", guitar: "alder" },
      { title: "Brickyard Snow", guitar: "birch" },
      { title: "A Kettle for the Watch", guitar: "birch" },
      { title: "Signal Box Hymn", guitar: "alder" },
      { title: "Elder and Iron", guitar: "birch" },
      { title: "Tallow Street", guitar: "alder" },
      { title: "The Last Boat Over", guitar: "alder" },
    ],
    [
      { title: "Blue Slate", guitar: "alder" },
      { title: "Rain on the Chapel Roof", guitar: "tin" },
      { title: "Half a Mile of Hedge", guitar: "birch" },
      { title: "Pennyroyal Bend", guitar: "alder" },
      { title: "The Weighbridge", guitar: "tin" },
      { title: "Lanterns Down the Quay", guitar: "birch" },
      { title: "Stonecrop", guitar: "alder" },
      { title: "What the River Kept", guitar: "alder" },
      { title: "Carry the Small Light", guitar: "birch", encore: true },
    ],
  ] as DemoEntry[][],
};
