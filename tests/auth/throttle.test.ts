import { afterAll, beforeAll, beforeEach, describe, expect, test } from "vitest";
import { hashPassword } from "@/lib/auth/password";
import { signIn } from "@/lib/auth/sign-in";
import { readOrigin } from "@/lib/auth/throttle";
import type { TestDatabase } from "../support/database";
import { makeMember, openTestDatabase } from "../support/database";

const RIGHT = "the right password";
const TOO_MANY = { name: "TooManyTriesError", message: "too-many-tries" };

let database: TestDatabase;
let email: string;
beforeAll(async () => {
  database = await openTestDatabase();
  const member = await makeMember(database, "engineer");
  const found = await database.owner.query(
    "update users set password_hash = $1 where id = $2 returning email",
    [await hashPassword(RIGHT), member.userId],
  );
  email = found.rows[0].email;
});
afterAll(() => database.close());
beforeEach(() => database.owner.query("delete from sign_in_attempts"));

/** Tries that were booked and never proven right, as the owner would find them. */
async function bookWrongTries(address: string, origin: string, count: number) {
  for (let i = 0; i < count; i++) {
    await database.owner.query("select begin_sign_in($1, $2)", [address, origin]);
  }
}

const tryTo = (password: string, origin: string, address = email) =>
  signIn(database.app, address, password, origin);

describe("sign-in throttling", () => {
  test("the tenth wrong password is still answered, the eleventh try is refused though right", async () => {
    for (let i = 0; i < 10; i++) expect(await tryTo("wrong", "10.0.0.1")).toBeNull();
    await expect(tryTo(RIGHT, "10.0.0.1")).rejects.toMatchObject(TOO_MANY);
    await expect(tryTo(RIGHT, "10.0.0.1", email.toUpperCase())).rejects.toMatchObject(TOO_MANY);
    expect(await tryTo(RIGHT, "10.0.0.2")).toMatchObject({ email });
  });

  test("thirty tries from anywhere close the address for every origin", async () => {
    for (const origin of ["10.0.0.1", "10.0.0.2", "10.0.0.3"]) {
      await bookWrongTries(email, origin, 10);
    }
    await expect(tryTo(RIGHT, "10.0.0.4")).rejects.toMatchObject(TOO_MANY);
    const other = await tryTo("wrong", "10.0.0.4", "somebody-else@saltmarsh.example");
    expect(other).toBeNull();
  });

  test("many tries at once get no more than their share", async () => {
    const outcomes = await Promise.allSettled(
      Array.from({ length: 16 }, () => tryTo("wrong", "10.0.0.1")),
    );
    expect(outcomes.filter((o) => o.status === "fulfilled")).toHaveLength(10);
  });

  test("an address that nobody has is throttled alike", async () => {
    await bookWrongTries("nobody@saltmarsh.example", "10.0.0.1", 10);
    const tried = tryTo("wrong", "10.0.0.1", "Nobody@saltmarsh.example");
    await expect(tried).rejects.toMatchObject(TOO_MANY);
  });

  test("the right password forgets the tries of its origin and no others", async () => {
    await bookWrongTries(email, "10.0.0.1", 9);
    await bookWrongTries(email, "10.0.0.9", 3);
    expect(await tryTo(RIGHT, "10.0.0.1")).toMatchObject({ email });
    const left = await database.owner.query("select 1 from sign_in_attempts");
    expect(left.rowCount).toBe(3);
  });

  test("after 15 minutes tries no longer count and are removed", async () => {
    await bookWrongTries(email, "10.0.0.1", 10);
    await database.owner.query("update sign_in_attempts set at = at - interval '15 minutes'");
    expect(await tryTo("wrong", "10.0.0.1")).toBeNull();
    const left = await database.owner.query("select 1 from sign_in_attempts");
    expect(left.rowCount).toBe(1);
  });

  test("neither address nor origin is stored in the clear", async () => {
    await bookWrongTries("my password by mistake", "10.0.0.1", 1);
    const [row] = (await database.owner.query("select * from sign_in_attempts")).rows;
    expect(row.address_digest).toMatch(/^[0-9a-f]{64}$/);
    expect(row.origin_digest).toMatch(/^[0-9a-f]{64}$/);
  });

  test("what cannot be an address is refused without being stored", async () => {
    expect(await tryTo(RIGHT, "10.0.0.1", "a\0b@saltmarsh.example")).toBeNull();
    expect(await tryTo(RIGHT, "10.0.0.1", `${"a".repeat(400)}@saltmarsh.example`)).toBeNull();
    const stored = await database.owner.query("select 1 from sign_in_attempts");
    expect(stored.rowCount).toBe(0);
  });
});

describe("origin of a try", () => {
  test("is what the nearest proxy saw, not what the asker claims", () => {
    expect(readOrigin("1.2.3.4, 10.0.0.7")).toBe("10.0.0.7");
    expect(readOrigin("10.0.0.7")).toBe("10.0.0.7");
    expect(readOrigin(undefined)).toBe("unknown");
    expect(readOrigin("")).toBe("unknown");
  });
});
