import { expect, test } from "vitest";
import { unrolledLdl } from "../../support/write-ldl.ts";

test("the unrolled factorisation is as its writer writes it", async () => {
  await expect(unrolledLdl()).toMatchFileSnapshot("../../../src/dynamics/solver/unrolled-ldl.ts");
});
