/**
 * Insulations by the velocity factor that coaxial cables made with them usually have. Pairs in a thin skin or with
 * air between the cores lie above these. Common practice; solid ones follow from their permittivity, 1/√εr.
 */
const usualVelocity: readonly { name: string; from: number; to: number }[] = [
  { name: "PVC", from: 0.45, to: 0.6 },
  { name: "solid polyethylene", from: 0.65, to: 0.67 },
  { name: "solid PTFE", from: 0.69, to: 0.705 },
  { name: "expanded PTFE", from: 0.76, to: 0.85 },
  { name: "foamed polyethylene", from: 0.78, to: 0.88 },
  { name: "air-spaced", from: 0.84, to: 0.95 },
];

/** The insulations that usually go with a velocity factor; none where it is unusual. */
export function insulationsOf(velocityFactor: number): string[] {
  return usualVelocity.filter(({ from, to }) => velocityFactor >= from && velocityFactor <= to).map(({ name }) => name);
}
