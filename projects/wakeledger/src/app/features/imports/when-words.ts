import { Pipe, type PipeTransform } from '@angular/core';

/** A moment as year-month-day and time of day, where the person is. */
@Pipe({ name: 'wlWhen' })
export class WhenWords implements PipeTransform {
  transform(timestamp: string): string {
    const moment = new Date(timestamp);
    const two = (value: number): string => String(value).padStart(2, '0');
    const day = `${String(moment.getFullYear())}-${two(moment.getMonth() + 1)}-${two(moment.getDate())}`;
    return `${day} ${two(moment.getHours())}:${two(moment.getMinutes())}`;
  }
}
