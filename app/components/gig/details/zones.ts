/** The time zones that this machine knows, with UTC, which it leaves out. */
export function zonesHere(): string[] {
  return [...Intl.supportedValuesOf("timeZone").filter((zone) => zone !== "UTC"), "UTC"];
}

/** The time zone that this machine is set to. */
export function zoneHere(): string {
  return Intl.DateTimeFormat().resolvedOptions().timeZone;
}

/**
 * Zones under the part of the world that their names begin with, in the order given.
 * @example zonesByRegion(["Europe/Dublin", "UTC"]) // [["Europe", ["Europe/Dublin"]], ["Other", ["UTC"]]]
 */
export function zonesByRegion(zones: readonly string[]): [string, string[]][] {
  const regions = new Map<string, string[]>();
  for (const zone of zones) {
    const region = zone.includes("/") ? zone.slice(0, zone.indexOf("/")) : "Other";
    regions.set(region, [...(regions.get(region) ?? []), zone]);
  }
  return [...regions];
}
