/** The page's fixed frame: places for the views, in the order in which an engineer asks. No data stands here. */

/** Sections after the first screen: id, heading, a line that says what it answers. */
const SECTIONS: readonly (readonly [string, string, string])[] = [
  [
    'whatif',
    'What if',
    'Move a value or a part of the open design, or the rail itself. The model inside this page recomputes it at once.',
  ],
  ['compare', 'Side by side', 'Pinned designs; what differs comes first.'],
  ['prices', 'What each limit costs', 'What relaxing a limit a little would buy.'],
  [
    'families',
    'Why these families',
    'Each architecture and phase count that was tried, and why it is on the front or not.',
  ],
  [
    'trust',
    'How far to trust it',
    'The search: whether it had settled, and how to repeat it. The model: see the shaded band on the picture.',
  ],
  [
    'away',
    'Take it away',
    'Files of the open design and of the designs left; the same bytes as the command line writes.',
  ],
  ['mind', 'Mind', 'What these figures cannot tell.'],
];

const DETAILS: readonly (readonly [string, string])[] = [
  ['effects', 'Every watt, by part and effect'],
  ['limits', 'How close to each limit'],
  ['parts', 'Parts'],
  ['efficiency', 'Efficiency over load'],
  ['waveforms', 'One switching period'],
  ['temperatures', 'How warm it gets'],
  ['makeup', 'What takes room and money'],
  ['proof', 'Predicted and simulated'],
];

/** Body of the page, without data. */
export function layout(): string {
  return `<button type="button" class="skip" data-act="go" data-to="picture">To the picture</button>
<header id="masthead"></header>
<main>
<section id="first" aria-label="Choose">
<div id="picture-card" class="card">
<div class="card-head"><h2>The trade-off</h2><div id="axes" class="controls">${axesControls()}</div></div>
<p class="how">Each mark is one buildable design. Left and down is better.</p>
<div id="picks" class="picks" role="group" aria-label="A few to start from"></div>
<div id="picture" class="plot" tabindex="0" role="slider" aria-label="Designs of the front, in the order of the horizontal axis" aria-orientation="horizontal" aria-valuemin="1" aria-valuemax="1" aria-valuenow="1" aria-describedby="keys"><canvas class="cloud" aria-hidden="true"></canvas><svg class="drawing" aria-hidden="true" focusable="false"></svg></div>
<div id="hover" class="hover" hidden></div>
<div id="legend" role="group" aria-label="Families: press to hide or show"></div>
<p id="picture-note" class="note"></p>
<div class="foot"><div class="zoom" role="group" aria-label="Zoom"><button type="button" data-act="closer" aria-label="Closer">+</button><button type="button" data-act="further" aria-label="Further">−</button><button type="button" data-act="whole">All</button></div><p id="keys" class="keys">Arrow keys: next design along an axis · P: pin · + − 0: zoom</p></div>
<details id="picture-numbers" class="numbers"><summary>Designs as a table</summary><div class="scroll" tabindex="0" role="region" aria-label="Designs as a table"></div></details>
</div>
<div id="narrow" class="card">
<div class="card-head"><h2>Ranges</h2><button type="button" class="quiet" data-act="clear" disabled>Clear</button></div>
<p id="count" class="count" role="status" aria-live="polite"></p>
<div id="ranges"></div>
<div class="adder"><label for="add-range">Another range</label><select id="add-range"></select></div>
</div>
<div id="open" class="card">
<div id="open-head"></div>
<h3>Where the watts go</h3>
<div id="losses" class="scroll" tabindex="0" role="region" aria-label="Where the watts go"></div>
<h3>Tightest limits</h3>
<div id="tightest" class="scroll" tabindex="0" role="region" aria-label="Tightest limits"></div>
</div>
</section>
<section id="detail" aria-label="The open design in detail">
<div class="section-head"><h2>The open design, in detail</h2><div class="controls"><label for="point">Operating point</label><select id="point"></select></div></div>
<div class="sheets">${DETAILS.map(([id, name]) => `<article class="card sheet" id="${id}-card"><h3>${name}</h3><div id="${id}" class="scroll"${focusable(name)}></div></article>`).join('\n')}</div>
</section>
${SECTIONS.map(([id, name, line]) => `<section id="${id}-section"><div class="section-head"><h2>${name}</h2><p class="how">${line}</p></div><div id="${id}" class="card">${id === 'whatif' ? whatIfPlaces() : ''}</div></section>`).join('\n')}
</main>
<footer id="colophon"></footer>`;
}

function focusable(name: string): string {
  return ` tabindex="0" role="region" aria-label="${name}"`;
}

function axesControls(): string {
  const select = (id: string, label: string) => `<label for="${id}">${label}</label><select id="${id}"></select>`;
  return `${select('axis-x', 'Across')}${select('axis-y', 'Up')}${select('axis-third', 'Mark')}`;
}

function whatIfPlaces(): string {
  return `<div id="knobs"></div><div class="moves"><svg id="move-picture" class="drawing" aria-hidden="true" focusable="false"></svg><div id="move" role="status" aria-live="polite"></div><button type="button" data-act="reset" disabled>Back to the design as chosen</button></div>`;
}
