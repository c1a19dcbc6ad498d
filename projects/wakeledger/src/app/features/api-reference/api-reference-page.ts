import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { asApiProblem } from '../../core/api/api-problem';
import { Busy } from '../../ui/busy/busy';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { OPENAPI_ADDRESS, OpenApiApi } from './openapi-api';
import { operationGroups } from './openapi-document';

/** How do scripts talk to Wakeledger? Every operation, read from the document that the server generates. */
@Component({
  selector: 'wl-api-reference-page',
  imports: [Busy, ProblemBanner],
  templateUrl: './api-reference-page.html',
  styleUrl: './api-reference-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ApiReferencePage {
  private readonly api = inject(OpenApiApi);

  protected readonly address = OPENAPI_ADDRESS;
  protected readonly document = rxResource({ stream: () => this.api.read() });
  protected readonly groups = computed(() =>
    this.document.hasValue() ? operationGroups(this.document.value()) : [],
  );
  protected readonly problem = computed(() => {
    const error = this.document.error();
    return error && asApiProblem(error.cause ?? error);
  });
}
