import type { FaultValues } from "../../domain/refusals";

const WHOSE: Record<string, string> = {
  tank: "the tank's plate",
  pump: "the pump's plate",
  gauge: "the end of the gauge's scale",
};

const whose = (values: FaultValues) => WHOSE[String(values.by)] ?? String(values.by);

/** What is wrong with a field of a truck, yard or check, and how to put it right. */
export const SETUP_FAULTS: Record<string, string | ((values: FaultValues) => string)> = {
  "unit-number-form":
    "Use letters, digits and hyphens, 20 at most, starting with a letter or digit: T-118.",
  "unit-number-taken": ({ unitNumber }) =>
    `${unitNumber} is in use already. Give this one another unit number.`,
  "unit-kind": "Say whether it drives itself or is towed.",
  "vin-form": "Type the VIN as stamped: 17 letters and digits at most, or leave it empty.",
  "yard-unknown": "Choose one of your yards.",
  "start-unknown": "Choose one of the usual trucks, or start with nothing fitted.",

  unprintable: "There are characters in it that cannot be printed. Type it anew.",

  "fitting-kind-unknown": "Choose a fitting from the list.",
  "fitting-only-one": "This truck has one already. Change that one, or remove it first.",
  "fitting-gone": "This fitting was removed. Restore it before changing it.",
  "value-missing": "Fill this in from the plate.",
  "choice-unknown": "Choose one from the list.",
  "not-a-number": "Type a number, such as 18.5.",
  "whole-number": "Type a whole number.",
  "unknown-unit": ({ units }) =>
    units ? `Choose a unit from the list: ${units}.` : "Choose a unit from the list.",
  "wrong-unit": ({ unit, units }) => `${unit} does not measure this. Use ${units}.`,
  "out-of-range": ({ low, high, unit }) => `Type a value from ${low} to ${high} ${unit}.`,
  "least-over-most": "The lowest speed is above the highest. Swap or correct them.",
  "set-point-over-plate": ({ what, value, by = "" }) =>
    `The ${what} is set at ${value}, over ${whose({ by })} as typed here. Lower the set point first, or correct the plate.`,
  "set-point-under-plate": ({ what, value }) =>
    `The ${what} is set at ${value}, under the lowest speed typed here. Raise the set point first, or correct the plate.`,

  "reading-unknown": "Choose a reading from the list.",
  "not-a-positive-number": "Type a number above zero.",
  "over-limit": ({ by = "", limit, unit }) =>
    `Over ${whose({ by })}, ${limit} ${unit}. Type ${limit} ${unit} or less.`,
  "under-plate": ({ limit, unit }) =>
    `Under the lowest speed on the pump's plate, ${limit} ${unit}. Type ${limit} ${unit} or more.`,
  "low-over-set-point": ({ setPoint, unit }) =>
    `The low end is above the set point. Type ${setPoint} ${unit} or less.`,
  "high-under-set-point": ({ setPoint, unit }) =>
    `The high end is below the set point. Type ${setPoint} ${unit} or more.`,
  "stop-below-band": ({ high, unit }) =>
    `The stop value is inside the band. Type ${high} ${unit} or more.`,
  "no-plate": "Enter the tank, the pump or the gauge first: one of them must say where to stop.",

  "test-kind-unknown": "Choose a test from the list.",
  "test-not-for-this-tank":
    "This test is for a tank with a specification plate. Say so at the tank first.",
  "date-form": "Type the date as year-month-day, such as 2026-04-30.",
  "date-missing": "Type the date.",
  "passed-in-future": "A test cannot be passed on a day to come. Type today or an earlier day.",
  "due-before-passed": "The last day lies before the day it was passed. Correct one of them.",
  "due-too-far": ({ latest }) =>
    `The rule allows ${latest} at the latest. Type that or an earlier day.`,
  "test-cannot-end": "The law asks for this one: record the next test in its place.",
  "note-long": "200 characters at most.",

  "yard-name": "Name the yard, 80 characters at most.",
  "yard-name-taken": "You have a yard of that name. Choose another name.",
  "zone-unknown": "Choose a time zone from the list, such as America/Denver.",
  "elevation-range": ({ low, high, unit }) => `Type an elevation from ${low} to ${high} ${unit}.`,
  "phone-form": "Type a telephone number: digits, spaces and + ( ) - . only, 32 at most.",
  "clock-form": "Type a time of day as hours and minutes, such as 06:00.",

  "own-check-label": "Say what to look at, 80 characters at most.",
  "own-check-good": "Say what good looks like in one line, 160 characters at most.",
  "station-unknown": "Choose a station from the list.",
  "cadence-unknown": "Choose how often.",
  "colour-unknown": "Choose the color of the tag.",
  "truck-unknown": "Choose one of your trucks, or all of them.",
};
