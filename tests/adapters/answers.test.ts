import { describe, expect, test } from "vitest";
import { attachment } from "@/lib/adapters/define-route";
import { problem } from "@/lib/adapters/problem";

describe("problem", () => {
  test.each([
    ["signed-out", 401],
    ["denied", 403],
    ["not-found", 404],
    ["conflict", 409],
    ["invalid", 422],
    ["broken", 500],
  ] as const)(
    "%s is answered with %i, as problem+json that no cache keeps",
    async (code, status) => {
      const response = problem(code, "A reason.", { name: "Say it." });
      expect(response.status).toBe(status);
      expect(response.headers.get("content-type")).toBe("application/problem+json");
      expect(response.headers.get("cache-control")).toBe("no-store");
      expect(await response.json()).toEqual({
        type: "about:blank",
        status,
        code,
        detail: "A reason.",
        fieldErrors: { name: "Say it." },
      });
    },
  );
});

/** What a browser takes as the name, by RFC 6266 and RFC 8187. */
function nameIn(header: string | undefined): string {
  const coded = /; filename\*=UTF-8''([A-Za-z0-9!#$&+\-.^_`|~%]+)$/.exec(header ?? "")?.[1];
  if (coded === undefined) throw new Error(`No name in ${header}`);
  return decodeURIComponent(coded);
}

describe("attachment", () => {
  test.each([
    "g1_vertical.csv",
    'a "quoted" \\ name.csv',
    "Süd 'A' (1)*.csv",
    "測定.csv",
    "a;b,c%20.csv",
  ])("hands %s over under its own name, on one line, never to be run in the page", (name) => {
    const headers = new Headers(attachment(name, "text/csv"));
    const disposition = headers.get("content-disposition") ?? "";
    expect(nameIn(disposition)).toBe(name);
    expect(disposition).toMatch(/^attachment; filename="[^"\\]*"; /);
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("cache-control")).toBe("private, no-store");
  });

  test("cannot be broken out of by a line feed in a name", () => {
    const headers = attachment("a\r\nset-cookie: x=1", "text/csv");
    expect(headers["content-disposition"]).not.toMatch(/[\r\n]/);
  });
});
