import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test, vi } from "vitest";
import { SignalPathEditor } from "@/components/benches/signal-path-editor";
import { MaskEditor } from "@/components/masks/mask-editor";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { MASK } from "../../commands/mask/arrange";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn() }) }));

const refuse = async () => ({ ok: false as const, message: "", fieldErrors: {} });

/** Controls that neither a label nor an aria-label names. */
function nameless(html: string): string[] {
  const labelled = new Set([...html.matchAll(/<label for="([^"]+)"/g)].map((m) => m[1]));
  const outside = html.replace(/<label class[\s\S]*?<\/label>/g, (label) =>
    label.includes("<input") ? "" : label,
  );
  return [...outside.matchAll(/<(?:input|select|textarea)\b[^>]*>/g)]
    .map((match) => match[0])
    .filter((tag) => {
      const id = / id="([^"]+)"/.exec(tag)?.[1];
      return !/aria-label="[^"]+"/.test(tag) && !(id && labelled.has(id));
    });
}

describe("the mask editor", () => {
  test("asks for what a new mask leaves open only once somebody tries to save it", () => {
    const html = renderToStaticMarkup(<MaskEditor save={refuse} />);
    expect(html).toContain("Create mask");
    expect(html).not.toContain("Give it a title.");
    expect(html).not.toContain('aria-invalid="');
    expect(nameless(html)).toEqual([]);
  });

  test("shows a stored mask with its units and says which revision saving makes", () => {
    const html = renderToStaticMarkup(
      <MaskEditor save={refuse} edited={{ maskId: "m", revision: 3, mask: MASK }} />,
    );
    expect(html).toContain("Save as revision 4");
    expect(html).toContain('value="230 MHz"');
    expect(html).toContain('value="120 kHz"');
    expect(nameless(html)).toEqual([]);
  });
});

describe("the signal path editor", () => {
  test("shows each table in MHz with every digit, and names every control", () => {
    const path: SignalPath = {
      version: 1,
      impedanceOhm: 75,
      transducers: [
        {
          name: "Mast antenna",
          kind: "antenna",
          calibratedOn: null,
          dueOn: "2027-02-01",
          factors: [
            { frequencyHz: 30_000_000.5, factorDb: 18.4999975 },
            { frequencyHz: 1e9, factorDb: 24 },
          ],
        },
      ],
    };
    const html = renderToStaticMarkup(
      <SignalPathEditor benchId="b" revision={1} path={path} save={refuse} readTable={refuse} />,
    );
    expect(html).toContain("30.0000005\t18.4999975\n1000\t24");
    expect(html).toContain("2 rows read, 30.00 MHz to 1.000 GHz.");
    expect(html).toContain("Save as revision 2");
    expect(nameless(html)).toEqual([]);
  });
});
