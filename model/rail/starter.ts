/** The sheet that a person starts from: every key, explained in its comments, with numbers that make a sound rail. */
import { ARCHITECTURES } from '../stages/list.ts';
import { OBJECTIVES } from './rail.ts';

/** A commented starter sheet; it reads without a finding. */
export function starterSheet(): string {
  return STARTER;
}

const STARTER = `# A rail sheet: what your step-down rail must do. Change the numbers to yours; what you do not know yet may stay as it is.
# Then, in this order:
#
#   chopfront check rail.yaml                       what the numbers mean, and what is wrong with them
#   chopfront sweep rail.yaml --out runs/first      search; Ctrl-C saves, --resume goes on
#   chopfront show runs/first DESIGN                one design of runs/first/page.html in the terminal
#
# Write quantities with their units: 48 V, 500 kHz, 4.7 µH (or uH), 10 mV, 55 °C, 85 %, 2 mΩ (or mohm), 25 cm² (or cm2).
# Lines that start with # are comments. A key that is a comment here shows its default, or a limit that does not bind.

rail: my-rail            # a name for the page and the files
currency: EUR            # of the prices in the parts tables
quantity: 1000           # pieces to buy; chooses the price breaks

input:
  voltage: {min: 18 V, nominal: 24 V, max: 32 V}   # or one value, such as 24 V
  source: {resistance: 10 mΩ, inductance: 0.5 µH}  # cable and supply; they decide what the input capacitors must do
  # ripple: 300 mV       # largest peak-to-peak ripple at the input terminals
  # source-ripple: 50 mA # largest peak-to-peak ripple current in the source; asks for a filter choke
  takes-power: no        # yes where the source can take power back

output:
  voltage: 5 V           # or {min: 10.5 V, nominal: 12.8 V, max: 14.6 V} for a battery
  current: 6 A           # full load
  ripple: 30 mV          # largest peak-to-peak ripple
  battery: no            # yes where the output is a source of its own

# A change of load that the output must ride through. Leave the block out where there is none.
load-step: {current: 3 A, slew: 2 A/µs, deviation: 150 mV}

# How much of the time at which share of full load; the shares sum to 100 %. Instead of a list, one of these names:
# full-load, average-25-50-75-100, points-10-20-50-100, cec, european.
# Negative loads run power back to the input; they need battery: yes and takes-power: yes.
load-profile:
  - {load: 10 %, share: 30 %}
  - {load: 50 %, share: 50 %}
  - {load: 100 %, share: 20 %}

light-load: diode-emulation   # or forced-continuous, phase-shedding

environment:
  ambient: 45 °C         # the warmest air around the board; limits are judged here
  air: still             # or the speed of the air, such as 2 m/s
  board-area: 30 cm²     # board that carries the heat away

# Limits beside those of physics and parts. Leave out what does not matter.
limits:
  height: 8 mm
  volume: 10 cm³
  # board-area: 15 cm²
  # mass: 30 g
  # cost: 12 EUR
  efficiency:
    - {load: 100 %, at-least: 90 %}
  # no-load-power: 100 mW
  # life: 20000 h           # of wet electrolytic capacitors over the load profile
  # minimum-on-time: 50 ns  # shortest on-time to plan with, whatever a controller promises

# Bands that the switching frequency must stay out of; harmonics: 3 keeps the second and third out too.
# avoid:
#   - {from: 485 kHz, to: 525 kHz, harmonics: 1}

# Worst-case deviations.
# tolerances: {inductance: 20 %, capacitance: 10 %, oscillator: 10 %, on-resistance: 10 %}

# Shares of the ratings that may be used, and the distance to every rated temperature.
# derating: {switch-voltage: 80 %, ceramic-voltage: 80 %, bulk-voltage: 80 %, ripple-current: 70 %, temperature: 15 K}

# The space to search.
search:
  # For large ratios also those with a transformer. There are: ${ARCHITECTURES.join(', ').replace(/(.{60,100}?,) /g, '$1\n  #   ')}.
  architectures: [buck-synchronous, buck-diode]
  phases: {from: 1, to: 4}
  frequency: {from: 50 kHz, to: 2 MHz}
  # inductance: {from: 0.1 µH, to: 100 µH}
  # wound-chokes: no     # yes to search chokes wound to order beside stocked inductors
  # parallel-switches: 4 # most in one position
  # ceramics: 12         # most at the output and at the input, each
  # bulks: 4

# Two to four of: ${OBJECTIVES.join(', ')}. All are made small.
objectives: [loss, volume, cost]

# Your own tables stand beside the built-in ones, or instead of them. To begin one, and to check it:
#   chopfront parts template switches --out my-switches.csv
#   chopfront parts check my-switches.csv
# Its prices are in the currency above, with a column for each price break; a stock column is looked at in the end.
# parts:
#   tables: [built-in, my-switches.csv]
#   bar: []              # names that must not be used
#   prefer: []           # names that alone may be used for their kind

# Designs that exist already, as spec files: the search starts from them.
# incumbents: [present-design.json]

# advanced: {islands: 8, population: 50, epoch-generations: 20, front-size: 500}
`;
