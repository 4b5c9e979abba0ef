import type { Browser, Page } from "@playwright/test";
import { signIn } from "./sign-in";

/** A page of its own browser context, signed in, so that several people can be there at once. */
export async function openAs(browser: Browser, email: string): Promise<Page> {
  const context = await browser.newContext();
  const page = await context.newPage();
  await signIn(page, email);
  return page;
}
