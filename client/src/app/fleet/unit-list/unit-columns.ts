import { pumpFaceWords, unitKindWords } from '@shared/fleet/fleet-words';
import type { Language } from '../../session/language-choice';
import type { TableColumn } from '../../ui/data-table/table-column';
import type { UnitRow } from '../unit-api';

/** The columns of the list of units; those without text have a template in the page. */
export function unitColumns(language: Language): readonly TableColumn<UnitRow>[] {
  return [
    { key: 'tag', label: $localize`:@@fleet.unit:Unit`, sort: 'tag' },
    { key: 'store', label: $localize`:@@fleet.store:Store`, sort: 'store' },
    {
      key: 'chain',
      label: $localize`:@@fleet.chain:Chain`,
      choice: 'off',
      text: (row) => row.chainName,
    },
    {
      key: 'region',
      label: $localize`:@@fleet.region:Region`,
      choice: 'off',
      text: (row) => row.regionName,
    },
    {
      key: 'kind',
      label: $localize`:@@fleet.kind:Kind`,
      sort: 'kind',
      choice: 'on',
      text: (row) => unitKindWords[row.kind][language],
    },
    {
      key: 'model',
      label: $localize`:@@fleet.model:Model`,
      sort: 'model',
      choice: 'on',
      text: (row) => row.model || null,
    },
    {
      key: 'vats',
      label: $localize`:@@fleet.vats:Vats`,
      sort: 'vats',
      align: 'end',
      choice: 'on',
      text: (row) => row.vats,
    },
    {
      key: 'oil',
      label: $localize`:@@fleet.oil-short:Oil, lb`,
      align: 'end',
      choice: 'off',
      text: (row) => row.oilPounds,
    },
    {
      key: 'face',
      label: $localize`:@@fleet.pump-face:Face of the pump`,
      choice: 'off',
      text: (row) => (row.pumpFace ? pumpFaceWords[row.pumpFace][language] : null),
    },
    {
      key: 'installed',
      label: $localize`:@@fleet.installed-on:Installed on`,
      sort: 'installed',
      choice: 'off',
    },
    { key: 'pump', label: $localize`:@@fleet.pump-since:Pump since`, choice: 'on' },
    { key: 'motor', label: $localize`:@@fleet.motor-since:Motor since`, choice: 'on' },
    {
      key: 'inspected',
      label: $localize`:@@fleet.last-inspected:Last inspected`,
      sort: 'inspected',
      choice: 'on',
    },
    {
      key: 'findings',
      label: $localize`:@@fleet.open-findings:Open findings`,
      sort: 'openFindings',
      align: 'end',
    },
  ];
}
