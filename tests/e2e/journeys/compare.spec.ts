import { routes } from '#shared/contracts/routes.ts';
import { paths } from '#src/ui/paths.ts';
import { expect, test } from '../support/app.ts';
import { ask } from './steps/ask.ts';
import { demoClip } from './steps/demo-clip.ts';
import { carryOn, COACH, sessionOf } from './steps/people.ts';
import { PREPARED_WITHIN } from './steps/visit.ts';

test.use({ viewport: { width: 390, height: 844 }, isMobile: true, hasTouch: true });

for (const width of [390, 360])
  test(`on a phone of ${width} px both films stand beside each other, and stay where they are while the moment moves`, async ({
    app,
    page,
  }) => {
    await page.setViewportSize({ width, height: 844 });
    test.setTimeout(PREPARED_WITHIN + 60_000);
    const coach = await sessionOf(app, COACH);
    const { visitId } = await demoClip(coach, 'Quill');
    const { reading } = await ask(coach, routes.sideReading, {
      params: { id: visitId, side: 'right' },
    });
    expect(reading).not.toBeNull();
    await carryOn(page, coach);
    const side = `${visitId}.right`;
    await page.goto(paths.compare({ first: side, second: side }));
    const films = page.getByRole('img', { name: /, frame \d+$/ });
    await expect(films).toHaveCount(2);
    const slider = page.getByRole('slider', { name: 'Moment' });
    const play = page.getByRole('button', { name: 'Play both slowly' });
    await expect(play).toBeEnabled();
    await page.locator('figure').first().scrollIntoViewIfNeeded();
    await page.evaluate(() => {
      const figure = document.querySelector('figure');
      scrollTo(0, scrollY + (figure?.getBoundingClientRect().top ?? 0));
    });

    const boxes = async () => {
      const [first, second, moment, button] = [
        await films.first().boundingBox(),
        await films.last().boundingBox(),
        await slider.boundingBox(),
        await play.boundingBox(),
      ];
      if (!first || !second || !moment || !button) throw new Error('not all of it is on the page');
      return { first, second, moment, button };
    };
    const before = await boxes();
    expect(before.second.x).toBeGreaterThan(before.first.x + before.first.width);
    expect(before.second.y).toBe(before.first.y);
    expect(before.first.height).toBeGreaterThan(220);
    // one screen holds what is looked at and what moves it
    expect(before.first.y).toBeGreaterThanOrEqual(0);
    expect(before.button.y + before.button.height).toBeLessThan(844);

    await slider.focus();
    const texts = new Set<string>();
    for (let n = 0; n < 12; n += 1) {
      texts.add(await page.locator('figure').first().innerText());
      expect(await boxes()).toEqual(before);
      await page.keyboard.press('PageUp');
    }
    // marked frames and those between were both come by
    expect([...texts].join(' ')).toContain('on a marked frame');
    expect([...texts].join(' ')).toContain('between two marks');
    await coach.dispose();
  });
