import type { OutlineDocument } from "./document.ts";

type Points = [number, number][];

const steel: Points = [
  [-1.32, -1.05],
  [-1.05, -1.45],
  [1.05, -1.45],
  [1.32, -1.05],
  [1.3, 0.55],
  [0.98, 0.95],
  [0.42, 1.35],
  [-0.42, 1.35],
  [-0.98, 0.95],
  [-1.3, 0.55],
];

const shouldered: Points = [
  [-1.32, -1.05],
  [-1.05, -1.45],
  [1.05, -1.45],
  [1.32, -1.05],
  [1.48, 0.3],
  [1.48, 0.66],
  [1.02, 1.08],
  [0.42, 1.4],
  [-0.42, 1.4],
  [-1.02, 1.08],
  [-1.48, 0.66],
  [-1.48, 0.3],
];

function scaled(points: Points, across: number, along: number): Points {
  const fine = (length: number): number => Math.round(length * 100_000) / 100_000;
  return points.map(([a, c]) => [fine(a * across), fine(c * along)]);
}

/** Aluminium rods need more section: the steel outline wider and longer. */
const aluminium = scaled(steel, 1.08, 1.1);

/** The rods of the 4.840 in spacing are larger both ways. */
const large = 1.05;

export const outlines: OutlineDocument[] = [
  { id: "steel", name: "Steel rod", material: "steel", points: steel },
  { id: "shouldered", name: "Steel rod, shouldered", material: "steel", points: shouldered },
  { id: "aluminium", name: "Aluminium rod", material: "aluminium", points: aluminium },
  { id: "steelLarge", name: "Steel rod, large", material: "steel", points: scaled(steel, large, large) },
  {
    id: "shoulderedLarge",
    name: "Steel rod, shouldered, large",
    material: "steel",
    points: scaled(shouldered, large, large),
  },
  {
    id: "aluminiumLarge",
    name: "Aluminium rod, large",
    material: "aluminium",
    points: scaled(aluminium, large, large),
  },
];
