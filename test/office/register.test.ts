import { CellFailure, PassedError } from "../../src/functions/failure";
import { NumericError } from "../../src/core/errors";
import { ERROR_CODES } from "../../src/office/errorCodes";
import { register } from "../../src/office/register";

class HostError extends Error {
  constructor(
    readonly code: string,
    message: string,
  ) {
    super(message);
  }
}

/** Registers one function with a stand-in for the host and gives what the host then calls. */
function registered(compute: (...args: any[]) => any): (...args: any[]) => any {
  const known: Record<string, (...args: any[]) => any> = {};
  const associate = (id: string, call: (...args: any[]) => any) => void (known[id] = call);
  (globalThis as any).CustomFunctions = { associate, Error: HostError };
  register({ NAME: compute });
  return known.NAME;
}
afterEach(() => {
  delete (globalThis as any).CustomFunctions;
});

const incoming = { code: "#REF!" };

test("results pass through", () => {
  expect(registered((a, b) => [[a + b]])(1, 2)).toEqual([[3]]);
});

test("failures inside a result become the host's errors in their places", () => {
  const result = registered(() => [[1], [new CellFailure("missing", "mass is blank")], [incoming]])();
  expect(result[0][0]).toBe(1);
  expect(result[1][0]).toBeInstanceOf(HostError);
  expect(result[1][0]).toMatchObject({ code: "#VALUE!", message: "mass is blank" });
  expect(result[2][0]).toBe(incoming);
});

test("a failure of the whole call is thrown as the host's error", () => {
  const call = registered(() => {
    throw new NumericError("pole", "an undamped mount has no steady response at resonance");
  });
  expect(call).toThrow(expect.objectContaining({ code: "#DIV/0!", message: expect.stringContaining("undamped") }));
});

test("an error that came in is returned unchanged: the host knows only some codes when it is thrown", () => {
  const call = registered(() => {
    throw new PassedError(incoming);
  });
  expect(call()).toEqual([[incoming]]);
  expect(call()[0][0]).toBe(incoming);
});

test("a promise is answered in the same way", async () => {
  const late = (outcome: () => any) => registered(async () => outcome())();
  expect(await late(() => [[1]])).toEqual([[1]]);
  await expect(
    late(() => {
      throw new CellFailure("not-covered", "no such unit");
    }),
  ).rejects.toMatchObject({ code: "#N/A", message: "no such unit" });
});

test("what is no failure of ours is a bug and goes through", () => {
  const call = registered(() => {
    throw new TypeError("bug");
  });
  expect(call).toThrow(TypeError);
});

test("every kind of failure has one of the errors that a cell can show", () => {
  for (const code of Object.values(ERROR_CODES)) expect(["#VALUE!", "#NUM!", "#DIV/0!", "#N/A"]).toContain(code);
  expect(ERROR_CODES.pole).toBe("#DIV/0!");
  expect(ERROR_CODES["not-covered"]).toBe("#N/A");
  expect(ERROR_CODES["outside-domain"]).toBe("#NUM!");
  expect(ERROR_CODES.missing).toBe("#VALUE!");
});
