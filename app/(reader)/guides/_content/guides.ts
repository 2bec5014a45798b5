/** A guide in Markdown, in our own words. */
export interface Guide {
  slug: string;
  title: string;
  lead: string;
  body: string;
}

export const GUIDES: readonly Guide[] = [
  {
    slug: 'units',
    title: 'Watts are already a rate',
    lead: 'A watt says how fast energy is used; a watt-hour says how much was.',
    body: `
A watt is a joule in a second. It is a rate, as a speed is. "Watts per hour" is therefore like "miles an hour per hour": somebody means either the rate or the amount. When you type it here, the form asks which.

| you mean | unit | for example |
| --- | --- | --- |
| how fast it draws now, or on average | W | a router idles at 7 W |
| how much it used | Wh, kWh | a wash took 580 Wh |
| how much it uses in a day | Wh a day | a freezer takes 830 Wh a day |
| what a supply must carry, volts times amperes | VA | an inverter is sized in VA |

## From one to the other

Power times time is energy. 44 W all day long is 44 × 24 = 1,056 Wh, or 1.056 kWh. One kilowatt-hour is 3.6 million joules, exactly.

## Watts and volt-amperes

On alternating current, volts times amperes is apparent power (VA). A device with a motor or a cheap supply may draw 35 VA and use 15 W of them. A clamp that sees only the current can't tell the two apart, so its figures stay in VA here and are never mixed with watts.

## Why a spot reading misleads

A fridge draws 80 W or 2 W, depending on when you look. Only its energy over whole days says anything. A kettle draws two kilowatts for three minutes and then nothing. That is why each category here is compared on a basis of its own: energy of a day, energy of a use, or power in a mode.
`,
  },
  {
    slug: 'reading-a-figure',
    title: 'How to read a published figure',
    lead: 'A pile of stones, a median, a range, and how sure it is.',
    body: `
Each stone on a device's pile is one **contributor**: somebody whose report was verified. However often they measure, they are one stone. Two members who measured the very same unit are one stone too. On a category's pile each stone is a device.

- The **median**, the small triangle, is the middle stone's value. One odd report hardly moves it.
- The **range** runs from the lowest stone to the highest. It is always shown, because it tells you what yours may draw.
- The bar below the line holds the **middle half**, from four contributors on.
- **±** is the expanded uncertainty (k = 2): what instruments and the spread from unit to unit leave open about the median.
- From six contributors on an **interval** says where the median lies with at least 95 % certainty, with its exact coverage.

## Flagged and set aside

A stone with a rust outline is **flagged**: it lies far from the others, and a moderator should look. It still counts. A hollow stone is **set aside**, with a reason that you can read. Nothing is dropped in silence.

## "At most"

Some instruments read nothing below a watt or so. Such a reading is neither zero nor one watt: it is "at most" the instrument's limit, and where it matters the median says so too.

## Beside the maker's claim

The slate bracket is what the maker states, in the mode that the statement is taken to mean. The outcome is ours: below, within or above when the probability of that is at least 95 %, otherwise too close to call. Where the claim means another mode, another room or another variant it is not comparable, and the reason stands there.
`,
  },
  {
    slug: 'measuring-safely',
    title: 'Measuring without getting hurt',
    lead: 'A plug-in meter at an ordinary socket does most of what is wanted. The rest is for licensed people.',
    body: `
Mains electricity can kill, and a battery can burn. Nothing on this site asks you to open a cover, and where these lines and your local code differ, the code and a licensed person decide.

## The plug-in meter

The weakest of socket, lead and meter sets the limit, and it is lower for loads that run for hours. Uncoil reels, build no chains of leads, keep everything dry. Warmth, a smell, browning: switch off upstream if that is safe, and stop.

## Fixed wiring and panels

Stop at the cover: what lies inside is licensed work under your local code. Have a meter installed, and record its readings. A metering breaker is never wired loose on a bench: it has live parts, no enclosure, and its protection is uncertain.

## Clamps

Round a whole cord a clamp reads almost nothing, since the currents cancel. Don't part the cord: use a rated, enclosed line splitter. In a panel it is licensed work, with an instrument and leads rated for that measurement category.

## Batteries, shunts and solar strings

A spanner across a battery can carry thousands of amperes. Main conductors and shunts are for a competent or licensed person: isolated, fused near the source, terminals covered, rings off. Solar strings are live in daylight and their arcs persist: never unplug them under load.

## Some devices need care of their own

- **Fridges and freezers** are not for switching off: food can spoil unseen. Let their own control stop them, and wait the maker's minimum off time after a cut.
- **Microwave ovens** are never opened: the charge inside can kill after unplugging. Measure at the plug, and never run one empty.
- **Medical devices**: don't interrupt, re-plug or meter one without its supplier's and clinician's agreement and a tested backup.
- **Pumps** never run dry. A shared or fire supply is agreed first.
- **Routers and storage**: shut down properly. Alarms, calls for help and neighbours may depend on them.
- **Generators** stay outdoors, away from openings: carbon monoxide. Never feed a house backwards through a socket.
`,
  },
  {
    slug: 'api-errors',
    title: 'What the API answers when something is wrong',
    lead: 'Problem details (RFC 9457), with one of a closed list of codes in “title”.',
    body: `
The body names the fields concerned in \`errors\`, each with a JSON pointer, and carries a \`requestId\` to quote.

| code | status | what to do |
| --- | --- | --- |
| bad-request | 400 | the request can't be read: mend it |
| not-signed-in | 401 | sign in |
| not-allowed | 403 | this is for somebody else, or came from another site |
| not-found | 404 | there is no such thing, or not for you |
| method-not-allowed | 405 | the address doesn't take that method |
| conflict | 409 | somebody was first: \`facts\` says who or what |
| gone | 410 | it was withdrawn, or the link was used |
| version-changed | 412 | it changed meanwhile: \`facts\` holds the newer one |
| too-large | 413 | send less |
| unsupported-kind | 415 | send another kind of file or body |
| bad-input | 422 | each field says what to change |
| version-missing | 428 | send If-Match with the version you read |
| too-many, quota-reached | 429 | wait as long as Retry-After says |
| unavailable | 503 | try again shortly: nothing was lost |
`,
  },
];
