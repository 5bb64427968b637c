import { expect, type Page } from '@playwright/test';

/** More stops than any page has. */
const ENOUGH = 500;

/**
 * Numbers every control that Tab has to reach, in the order of the page; of a group of radios one, the others are
 * reached by arrows. Returns what each is called, for the words of a failure.
 */
const numberControls = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const groups = new Set<string>();
    Object.assign(globalThis, { met: [] });
    const isStop = (element: HTMLElement | SVGElement) => {
      if (element.tabIndex < 0 || element.matches(':disabled') || element.closest('[inert]'))
        return false;
      if (element.getClientRects().length === 0) return false;
      if (!element.checkVisibility({ visibilityProperty: true })) return false;
      if (!(element instanceof HTMLInputElement) || element.type !== 'radio') return true;
      if (groups.has(element.name)) return false;
      groups.add(element.name);
      return true;
    };
    const all = document.querySelectorAll<HTMLElement | SVGElement>(
      'a[href], button, input, select, textarea, summary, [tabindex]',
    );
    const stops = [...all].filter(isStop);
    stops.forEach((element, n) => element.setAttribute('data-stop', String(n)));
    return stops.map((element) => element.outerHTML.slice(0, 200));
  });

interface Here {
  /** The number of the control that has the focus; null where it is none. */
  readonly stop: number | null;
  /** Which element it is, whether it was numbered or not; null where the page itself has the focus. */
  readonly element: number | null;
  readonly html: string;
  /** It has a stop for each of its parts. */
  readonly parted: boolean;
  /** What is wrong with how its focus shows; null where nothing is. */
  readonly fault: string | null;
}

/** Where the focus is, and whether a person could see it. */
const focusHere = (page: Page): Promise<Here> =>
  page.evaluate(async () => {
    const met = ((globalThis as { met?: Element[] }).met ??= []);
    const here = document.activeElement;
    if (here === null || here === document.body || here === document.documentElement)
      return { stop: null, element: null, html: '', parted: false, fault: null };
    if (!met.includes(here)) met.push(here);
    const group =
      here instanceof HTMLInputElement && here.type === 'radio'
        ? [...document.querySelectorAll<HTMLInputElement>('input[type=radio][data-stop]')].find(
            ({ name }) => name === here.name,
          )
        : here;
    const number = (group ?? here).getAttribute('data-stop');

    // a control that is drawn by its neighbour wears its ring there
    const ringed = [here, here.nextElementSibling, here.parentElement, here.closest('label')].find(
      (element) => {
        if (element === null) return false;
        const { outlineStyle, outlineWidth } = getComputedStyle(element);
        return outlineStyle !== 'none' && parseFloat(outlineWidth) >= 2;
      },
    );
    const faultOf = () => {
      if (!ringed) return 'nothing shows the focus';
      const box = ringed.getClientRects()[0];
      if (box === undefined) return 'it is not on the page';
      // the middle of what of it lies in the window
      const [left, right] = [Math.max(box.left, 0), Math.min(box.right, innerWidth)];
      const [top, bottom] = [Math.max(box.top, 0), Math.min(box.bottom, innerHeight)];
      if (left >= right || top >= bottom) return 'it is out of sight';
      // what stays where it is while the page scrolls must not lie over it
      let over = document.elementFromPoint((left + right) / 2, (top + bottom) / 2);
      for (; over && !over.contains(ringed); over = over.parentElement)
        if (['fixed', 'sticky'].includes(getComputedStyle(over).position))
          return 'something lies over it';
      return null;
    };
    // the page may still be scrolling there
    for (let frames = 0; frames < 30 && faultOf() !== null; frames += 1)
      await new Promise((drawn) => requestAnimationFrame(drawn));
    return {
      stop: number === null ? null : Number(number),
      element: met.indexOf(here),
      html: here.outerHTML.slice(0, 200),
      parted: here.matches('input[type=date]'),
      fault: faultOf(),
    };
  });

/** Goes once round the page with Tab: every control is reached, its focus can be seen, and nothing holds it. */
export async function expectKeyboardWay(page: Page): Promise<void> {
  const controls = await numberControls(page);
  const reached = new Set<number>();
  const met = new Set<number>();
  const faults: string[] = [];
  let before: number | null = null;
  for (let n = 0; controls.length > 0; n += 1) {
    expect(n, 'the way round the page has no end').toBeLessThan(ENOUGH);
    await page.keyboard.press('Tab');
    const { stop, element, html, parted, fault } = await focusHere(page);
    const within = parted && element === before;
    before = element;
    // past its last control the page gives the focus back to the browser for one step
    if (element === null || within) continue;
    if (met.has(element)) {
      expect(element, `Tab comes back to ${html} and never leaves`).toBe(0);
      break;
    }
    met.add(element);
    if (stop !== null) reached.add(stop);
    if (fault !== null) faults.push(`${fault}: ${html}`);
  }
  await page.evaluate(() => (document.activeElement as HTMLElement | null)?.blur());
  expect.soft(faults).toEqual([]);
  expect
    .soft(
      controls.filter((_, n) => !reached.has(n)),
      'Tab passes these by',
    )
    .toEqual([]);
}
