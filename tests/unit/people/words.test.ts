import { expect, test } from "vitest";
import { deviceWords } from "#app/components/account/device-words.ts";
import { dayAndTime } from "#app/components/time-words.ts";
import { waitWords } from "#app/services/rate-limit.server.ts";

test.each([
  [1, "1 second"],
  [60, "60 seconds"],
  [61, "2 minutes"],
  [900, "15 minutes"],
])("%i s to wait is %s", (seconds, words) => {
  expect(waitWords(seconds)).toBe(words);
});

test.each([
  ["Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0", "Firefox on Linux"],
  [
    "Mozilla/5.0 (iPhone; CPU iPhone OS 18_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.5 Mobile/15E148 Safari/604.1",
    "Safari on iPhone",
  ],
  [
    "Mozilla/5.0 (Linux; Android 10; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36",
    "Chrome on Android",
  ],
  [
    "Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36 Edg/140.0.0.0",
    "Edge on Windows",
  ],
  ["curl/8.5.0", "Unknown browser"],
  ["", "Unknown browser"],
])("%s is %s", (agent, words) => {
  expect(deviceWords(agent)).toBe(words);
});

test("a moment is written in UTC", () => {
  expect(dayAndTime(new Date(Date.UTC(2026, 11, 3, 14, 5)))).toBe("3 December 2026 at 14:05 UTC");
});
