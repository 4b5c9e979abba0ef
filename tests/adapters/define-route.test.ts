import { afterEach, expect, test, vi } from "vitest";
import { defineRoute } from "@/lib/adapters/define-route";
import { CommandError } from "@/lib/commands/result";
import { findCurrentMember } from "@/lib/auth/session";

vi.mock("@/lib/auth/session", () => ({ findCurrentMember: vi.fn() }));

afterEach(() => vi.restoreAllMocks());

const request = new Request("http://127.0.0.1/api/v1/sweeps/1/file");
const props = { params: Promise.resolve({ sweepId: "1" }) };
const ctx = { teamId: "team", userId: "user", role: "engineer" };

/** Signs somebody in, or nobody. */
function signedIn(member: unknown) {
  vi.mocked(findCurrentMember).mockImplementation(() => Promise.resolve(member as never));
}

test("nobody who is not signed in reaches the body of a route", async () => {
  signedIn(null);
  const body = vi.fn();
  const response = await defineRoute(body)(request, props);
  expect(response.status).toBe(401);
  expect(body).not.toHaveBeenCalled();
});

test("the body gets the member's context, the request and the parameters, and its answer is given", async () => {
  signedIn({ ctx });
  const body = vi.fn(() => Promise.resolve(new Response("levels", { status: 203 })));
  const response = await defineRoute(body)(request, props);
  expect(body).toHaveBeenCalledWith(ctx, request, { sweepId: "1" });
  expect([response.status, await response.text()]).toEqual([203, "levels"]);
});

test("a refusal is answered with its reason and its fields", async () => {
  signedIn({ ctx });
  const response = await defineRoute(() => {
    throw new CommandError("conflict", "It is here already.", { file: "Twice." });
  })(request, props);
  expect(response.status).toBe(409);
  expect(await response.json()).toMatchObject({
    code: "conflict",
    detail: "It is here already.",
    fieldErrors: { file: "Twice." },
  });
});

test("an unknown error is kept in the log under an id and tells the outside nothing else", async () => {
  signedIn({ ctx });
  const logged = vi.spyOn(console, "error").mockImplementation(() => undefined);
  const response = await defineRoute(() => {
    throw new Error("password of the database");
  })(request, props);
  const answer = await response.text();
  expect(response.status).toBe(500);
  expect(answer).not.toContain("password");
  const id = /Mention ([0-9a-f]{8}) /.exec(answer)?.[1] ?? "none";
  expect(logged.mock.calls[0]?.[0]).toContain(id);
});
