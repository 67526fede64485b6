import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { caseOf, createFakeBrowser } from "./fakeBrowser.ts";
import { createFakeChannels } from "./fakeChannels.ts";

let browser: ReturnType<typeof createFakeBrowser>;
beforeEach(() => {
  browser = createFakeBrowser();
});
afterEach(() => {
  browser.kill();
  vi.useRealTimers();
});

describe.each([
  ["Web Locks", {}],
  ["asking the other tabs", { locks: null }],
])("one writer a case, by %s", (_, change) => {
  const tab = () => browser.ready(change);

  test("the first is the writer, the second a reader until the first lets go", async () => {
    const [one, two] = [await tab(), await tab()];
    const turn = vi.fn();
    expect(await one.claim("a", vi.fn())).toBe("writer");
    expect(await two.claim("a", turn)).toBe("reader");
    expect(await two.claim("b", vi.fn())).toBe("writer");
    expect(await two.save(caseOf("a"))).toMatchObject({ ok: false, reason: "read-only", detail: "other-tab" });
    expect(await two.remove("a")).toMatchObject({ ok: false, reason: "read-only" });
    expect(await one.save(caseOf("a"))).toMatchObject({ ok: true });
    expect(turn).not.toHaveBeenCalled();
    await one.release("a");
    await vi.waitFor(() => expect(turn).toHaveBeenCalledOnce());
    expect(await one.save(caseOf("a"))).toMatchObject({ ok: false, reason: "read-only" });
    // It must read what the other wrote before it may write.
    expect(await two.save(caseOf("a", "unseen"))).toMatchObject({ ok: false, reason: "read-only" });
    await two.load("a");
    expect(await two.save(caseOf("a", "seen"))).toMatchObject({ ok: true });
  });

  test("of two at once exactly one writes", async () => {
    const tabs = [await tab(), await tab(), await tab()];
    const roles = await Promise.all(tabs.map((each) => each.claim("a", vi.fn())));
    expect(roles.sort()).toEqual(["reader", "reader", "writer"]);
  });

  test("a reader that leaves the line is not called", async () => {
    const [one, two, three] = [await tab(), await tab(), await tab()];
    const [left, next] = [vi.fn(), vi.fn()];
    await one.claim("a", vi.fn());
    await two.claim("a", left);
    await three.claim("a", next);
    await two.release("a");
    await one.release("a");
    await vi.waitFor(() => expect(next).toHaveBeenCalledOnce());
    expect(left).not.toHaveBeenCalled();
  });

  test("without a claim a save takes the place for its own length", async () => {
    const [one, two] = [await tab(), await tab()];
    expect(await one.save(caseOf("a"))).toMatchObject({ ok: true });
    expect(await two.claim("a", vi.fn())).toBe("writer");
    expect(await one.save(caseOf("a"))).toMatchObject({ ok: false, reason: "read-only" });
  });

  test("claiming twice in one tab is a programmer's mistake", async () => {
    const one = await tab();
    await one.claim("a", vi.fn());
    await expect((async () => one.claim("a", vi.fn()))()).rejects.toThrow(RangeError);
  });
});

test("Web Locks: the place of a tab that died goes to the next in line", async () => {
  const manager = browser.locks.tab();
  const one = await browser.ready({ locks: manager.manager });
  const two = await browser.ready();
  const turn = vi.fn();
  await one.claim("a", vi.fn());
  await two.claim("a", turn);
  manager.die();
  await vi.waitFor(() => expect(turn).toHaveBeenCalledOnce());
});

test("asking: a tab that died never says it let go, so a reader asks again", async () => {
  const channels = createFakeChannels();
  const one = await browser.ready({ locks: null, makeChannel: channels.make });
  const two = await browser.ready({ locks: null, makeChannel: channels.make });
  vi.useFakeTimers();
  const turn = vi.fn();
  const first = one.claim("a", vi.fn());
  await vi.advanceTimersByTimeAsync(400);
  expect(await first).toBe("writer");
  const second = two.claim("a", turn);
  await vi.advanceTimersByTimeAsync(400);
  expect(await second).toBe("reader");
  await vi.advanceTimersByTimeAsync(6_000);
  expect(turn).not.toHaveBeenCalled();
  one.close();
  await vi.advanceTimersByTimeAsync(6_000);
  expect(turn).toHaveBeenCalledOnce();
});

test("a browser that can't lock or copy says so when it opens", async () => {
  const tab = browser.tab({ locks: null, openPrivateFiles: null });
  const heard: string[] = [];
  tab.subscribe((change) => change.kind === "fault" && heard.push(...change.issues.map(({ code }) => code)));
  await tab.open();
  expect(heard).toEqual(["storage-no-locks", "storage-no-copies"]);
});
