import { TestBed } from '@angular/core/testing';
import { FormArray, NonNullableFormBuilder } from '@angular/forms';
import { PointsTable } from './points-table';
import { pointForm, type PointForm } from './result-form';

describe('the table of points', () => {
  async function shown() {
    const points = new FormArray<PointForm>([pointForm(TestBed.inject(NonNullableFormBuilder), 0)]);
    const fixture = TestBed.createComponent(PointsTable);
    fixture.componentRef.setInput('points', points);
    fixture.componentRef.setInput('valueWords', 'Drag force');
    fixture.componentRef.setInput('unit', 'N');
    fixture.componentRef.setInput('speedUnit', 'km/h');
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    const paste = async (text: string): Promise<Event> => {
      const event = new Event('paste', { bubbles: true, cancelable: true });
      Object.assign(event, { clipboardData: { getData: () => text } });
      host.querySelector('tbody input')?.dispatchEvent(event);
      await fixture.whenStable();
      return event;
    };
    const press = async (words: string): Promise<void> => {
      const buttons = [...host.querySelectorAll('button')];
      buttons.find((button) => button.textContent?.trim() === words)?.click();
      await fixture.whenStable();
    };
    return { points, host, paste, press };
  }

  it('takes a table from a spreadsheet, one row each', async () => {
    const { points, host, paste } = await shown();
    const event = await paste('-5\t541,2\n0\t539,6\n5\t541,3');
    expect(event.defaultPrevented).toBe(true);
    expect(points.getRawValue().map(({ yawDeg, value }) => [yawDeg, value])).toEqual([
      [-5, 541.2],
      [0, 539.6],
      [5, 541.3],
    ]);
    expect(host.querySelectorAll('tbody tr')).toHaveLength(3);
  });

  it('leaves a single figure to the field that it is pasted into', async () => {
    const { paste } = await shown();
    expect((await paste('539,6')).defaultPrevented).toBe(false);
  });

  it('asks which mark is meant where the table cannot tell, and then takes it', async () => {
    const { points, host, paste, press } = await shown();
    await paste('0\t539.612\n5\t541.118');
    expect(host.querySelector('[role=alert]')?.textContent).toContain('539.612');
    expect(points.at(0).value.value).toBeNull();
    await press('539612');
    expect(points.getRawValue().map(({ value }) => value)).toEqual([539612, 541118]);
    expect(host.querySelector('[role=alert]')).toBeNull();
  });

  it('says how many cells were no numbers', async () => {
    const { host, paste } = await shown();
    await paste('0\tn/a\n5\t541.1');
    expect(host.querySelector('[role=status]')?.textContent).toContain('One pasted cell is no number');
  });

  it('adds a row and takes one out', async () => {
    const { points, host, press } = await shown();
    await press('Add a point');
    expect(points.length).toBe(2);
    host.querySelector<HTMLButtonElement>('tbody button')?.click();
    expect(points.length).toBe(1);
  });
});
