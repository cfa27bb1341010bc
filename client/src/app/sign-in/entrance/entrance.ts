import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { LanguageChoice } from '../../session/language-choice';
import { Brand } from '../../ui/brand/brand';

/** The frame of the pages before signing in: what this is, and the choice of language. */
@Component({
  selector: 'vw-entrance',
  imports: [Brand, RouterOutlet],
  templateUrl: './entrance.html',
  styleUrl: './entrance.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Entrance {
  protected readonly language = inject(LanguageChoice);
}
