import { ChangeDetectionStrategy, Component } from '@angular/core';

/** What goes with every test, whatever the figures say. */
@Component({
  selector: 'wl-plan-cautions',
  template: `
    <h2 i18n>Before anybody runs it</h2>
    <ul>
      <li i18n>
        <strong>Parts in the jet.</strong> Everything on the model is held against the air load at the highest
        speed of the test and checked before each run; a part that comes off goes through the fan.
      </li>
      <li i18n>
        <strong>Belts and wheels that turn.</strong> Nobody is in the section while they do; guards and
        emergency stop are tried first, and wheels and tyres are rated for the speed.
      </li>
      <li i18n>
        <strong>Pressurised or cryogenic plant.</strong> Only with the plant’s own procedures: pressure, cold
        and the want of oxygen kill without warning.
      </li>
      <li i18n>
        <strong>Tests on the road.</strong> Only where and how the law and the proving ground allow.
      </li>
    </ul>
    <p i18n>
      These figures are estimates for planning. Local rules and the licensed practice of the facility decide
      what is run.
    </p>
  `,
  styles: `
    ul {
      display: grid;
      gap: 4px;
      margin: 8px 0;
      padding-left: 20px;
      max-width: 80ch;
    }
    p {
      margin: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanCautions {}
