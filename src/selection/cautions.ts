import { centroid } from "../machine/index.ts";
import type { SelectionRequest } from "./request.ts";

/** What holds for every answer, whatever was asked. */
const STANDING = [
  "Results come from ratings, not from tests of the delivered parts.",
  "Seismic and wind restraint, and the strength and stiffness of the structure below, belong to local codes and a licensed engineer.",
  "Pipes, ducts, cables and shafts that join the machine to the building carry vibration past the isolators unless they are flexible.",
];

/** A CG off the centroid of the feet by more than this share of their span tilts the machine noticeably. */
const OFF_CENTRE = 0.05;

/** What the user of an answer must know beside its numbers, most general last. */
export function cautionsFor({
  machine,
  mounting,
}: Pick<SelectionRequest, "machine" | "mounting">): readonly string[] {
  const cautions: string[] = [];
  const { feet, centreOfGravity: cg } = machine;
  if (feet !== null && machine.rigid === null)
    cautions.push(
      "The height of the centre of gravity is not known: how the machine tilts and rocks is not analysed. Give it, or the envelope.",
    );
  if (feet !== null && cg !== null && machine.rigid === null) {
    const places = feet.map((foot) => foot.position);
    const [x, y] = centroid(places);
    const span = Math.max(...places.flatMap((p) => places.map((q) => Math.hypot(p[0] - q[0], p[1] - q[1]))));
    if (Math.hypot(cg.x - x, cg.y - y) > OFF_CENTRE * span)
      cautions.push(
        "The centre of gravity is off the centre of the feet: the machine also rocks, which the vertical model does not show.",
      );
  }
  if (machine.speed.min < machine.speed.max)
    cautions.push("Over a speed range the machine may dwell at a natural frequency: see the notes.");
  cautions.push(
    "Every start and stop passes through the natural frequency: keep people clear while it does.",
  );
  if (mounting === "suspended")
    cautions.push(
      "A suspended machine needs an independent means of holding it should a hanger fail; keep clear below.",
    );
  return [...cautions, ...STANDING];
}
