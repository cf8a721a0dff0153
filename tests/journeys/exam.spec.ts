/** A therapist types an exam while a colleague reads it out, and asks why the grade is what it is. No hand leaves the keyboard. */
import { expect, test } from '@playwright/test';
import type { Locator, Page } from '@playwright/test';
import { look } from './looks.ts';

/**
 * Worked by hand from the rules of the standard. Sensation is normal to C5 on both sides and altered below, so both sensory
 * levels are C5. Right arm 5, 2: motor level C5. Left arm 5, 3: motor level C6. The level of injury is C5, the higher one.
 * Pressure is felt but nothing contracts, so C and not B needs movement more than three levels below a motor level: right T1
 * (grade 1, four levels below C5) and left L2 (grade 1). Of the 18 key muscles below C5 one reaches 3: fewer than half, so C.
 */
const sensory = '2222' + '1'.repeat(24);
const right = '5211100000';
const left = '5310010000';
const contraction = '0';
const pressure = '1';

const cell = (page: Page, name: string): Locator => page.getByRole('gridcell', { name: new RegExp(`^${name}:`) });
const focusedCell = (page: Page): Locator => page.locator('[role=gridcell]:focus');
const result = (page: Page, name: string): Locator => page.getByRole('button', { name: new RegExp(`^${name}: `) });

/** Goes on with Tab, or back with Shift+Tab, until something has the focus. */
async function tabTo(page: Page, target: Locator, key: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
  for (let stops = 0; stops < 80; stops += 1) {
    await page.keyboard.press(key);
    if (await target.evaluate((element) => element === document.activeElement)) return;
  }
  throw new Error('Eighty stops of the keyboard did not lead there.');
}

async function typeExam(page: Page): Promise<void> {
  await tabTo(page, cell(page, 'Light touch, right, C2'));
  await page.keyboard.type(sensory.repeat(4) + right + left + contraction + pressure);
}

test.beforeEach(async ({ page }) => {
  await page.goto('/exam');
  await expect(page.getByRole('heading', { level: 1, name: 'Exam sheet' })).toBeVisible();
});

test('type an exam by keyboard alone, and read why it is AIS C and not B', async ({ page }) => {
  await typeExam(page);
  await expect(page.getByText('134 of 134 cells are written.')).toBeVisible();
  await expect(result(page, 'Neurological level of injury')).toHaveText(/C5/);
  await expect(result(page, 'Motor level, left')).toHaveText(/C6/);

  await tabTo(page, result(page, 'AIS grade'));
  await page.keyboard.press('Enter');
  const why = page.getByRole('region', { name: 'Result' });
  await expect(why.getByRole('heading', { name: 'Why AIS grade is C' })).toBeVisible();
  await expect(why).toContainText('On the right, movement more than three levels below the motor level C5: T1 (grade 1).');
  await expect(why).toContainText('So the injury is motor incomplete, not B.');
  await expect(why).toContainText('1 of the 18 key muscles below the level of injury C5 reach grade 3');
  await expect(cell(page, 'Key muscle, right, T1')).toHaveAccessibleName(/decides the result chosen/);
  await look(page, 'exam-full');

  // The two movements taken away, nothing is left that makes it more than B.
  await tabTo(page, page.getByText(/cells marked on the sheet/));
  await page.keyboard.press('Enter');
  await tabTo(page, page.getByRole('button', { name: 'Key muscle, right, T1: 1' }));
  await page.keyboard.press('Enter');
  await page.keyboard.type('0');
  await page.keyboard.press('ArrowRight');
  await expect(focusedCell(page)).toHaveAccessibleName(/^Key muscle, left, L2: 1/);
  await page.keyboard.type('0');
  await expect(why.getByRole('heading', { name: 'Why AIS grade is B' })).toBeVisible();
  await expect(why).toContainText('so the injury is motor complete: B.');
});

test('star a score, say what is behind it, and give a reason for a cell not tested', async ({ page }) => {
  await tabTo(page, cell(page, 'Light touch, right, C2'));
  await page.keyboard.type('2n');
  await page.keyboard.type('r5');
  await expect(page.getByText('Not tested (contracture): Light touch, right, C3.')).toBeVisible();
  await page.keyboard.type('1*');
  await expect(page.getByRole('form', { name: 'Star on Light touch, right, C4' })).toBeVisible();
  await look(page, 'exam-star');
  await page.keyboard.type('14');
  await expect(page.getByText('Light touch, right, C4, 1*: burn or scar; counts as not normal.')).toBeVisible();
  await expect(focusedCell(page)).toHaveAccessibleName(/^Light touch, right, C5: blank/);
  // The rest of this column as normal; then one step back.
  await page.keyboard.type('d');
  await expect(cell(page, 'Light touch, right, S4-5')).toHaveText('2');
  await page.keyboard.press('Control+z');
  await expect(cell(page, 'Light touch, right, S4-5')).toHaveText('');
});

test('nothing typed leaves the page, and leaving it is asked about', async ({ page }) => {
  await page.waitForLoadState('networkidle');
  const asked: string[] = [];
  page.on('request', (request) => asked.push(`${request.method()} ${request.url()}`));
  await typeExam(page);
  await expect(result(page, 'AIS grade')).toHaveText(/C/);
  expect(asked).toEqual([]);
  expect(page.url()).toMatch(/\/exam$/);
  expect(await page.evaluate(() => JSON.stringify([{ ...localStorage }, { ...sessionStorage }]))).not.toMatch(/2222|lt_r/);

  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Dictionary' }).click();
  const question = page.getByRole('alertdialog', { name: 'Leave this exam?' });
  await question.getByRole('button', { name: 'Stay with the exam' }).click();
  await expect(cell(page, 'Light touch, right, C2')).toHaveText('2');
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Dictionary' }).click();
  await question.getByRole('button', { name: 'Leave and forget it' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Dictionary' })).toBeVisible();
});

test('the sheet with its result prints on one page', async ({ page }) => {
  await typeExam(page);
  await result(page, 'AIS grade').click();
  await expect(page.getByRole('heading', { name: 'Why AIS grade is C' })).toBeVisible();
  const pdf = await page.pdf({ format: 'A4' });
  expect(pdf.toString('latin1').match(/\/Type \/Page\b/g)).toHaveLength(1);
});

test('a blank sheet can be read on any screen', async ({ page }) => {
  await look(page, 'exam-blank');
});

/** Low windows, a telephone held sideways, a page at four times its size. */
const lowWindows = [
  [320, 568],
  [1440, 600],
  [700, 360],
  [320, 256],
] as const;
for (const [width, height] of lowWindows)
  test(`in a window of ${width} by ${height} the cell that is typed into is never covered`, async ({ page }) => {
    await page.setViewportSize({ width, height });
    await tabTo(page, cell(page, 'Light touch, right, C2'));
    // Down the columns of sensation to the first of strength, whose keys take more lines.
    for (const typed of [...sensory.repeat(4), ...right]) {
      const isInFront = await focusedCell(page).evaluate((element) => {
        const { left, top, width: wide, height: high } = element.getBoundingClientRect();
        return element.contains(document.elementFromPoint(left + wide / 2, top + high / 2));
      });
      expect(isInFront, `${await focusedCell(page).getAttribute('data-cell')}`).toBe(true);
      await page.keyboard.type(typed);
    }
  });
