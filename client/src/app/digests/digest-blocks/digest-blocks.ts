import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { Block } from '@shared/mail/block';
import { Figure } from '../../ui/figure/figure';

interface Section {
  readonly heading: string;
  readonly blocks: readonly Block[];
}

/** The blocks of a digest as a page: the same words and figures as in its letter. */
@Component({
  selector: 'vw-digest-blocks',
  imports: [Figure, RouterLink],
  templateUrl: './digest-blocks.html',
  styleUrl: './digest-blocks.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DigestBlocks {
  private readonly router = inject(Router);

  readonly blocks = input.required<readonly Block[]>();

  /** A heading opens a section with all that follows it, kept together in print. */
  protected readonly sections = computed(() => {
    const sections: { heading: string; blocks: Block[] }[] = [];
    for (const block of this.blocks()) {
      const last = sections.at(-1);
      if (block.kind === 'heading') sections.push({ heading: block.text, blocks: [] });
      else if (last) last.blocks.push(block);
      else sections.push({ heading: '', blocks: [block] });
    }
    return sections as readonly Section[];
  });

  protected path(href: string): string {
    return href.split('?')[0] ?? href;
  }

  protected query(href: string): Readonly<Record<string, string>> {
    return this.router.parseUrl(href).queryParams;
  }
}
