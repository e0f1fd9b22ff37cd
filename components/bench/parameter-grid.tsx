/** Controls made from the catalogue's own description of its parameters: a slider for a quantity, a list for a choice. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Select } from '@/components/ui/select';
import { Slider } from '@/components/ui/slider';
import { space } from '@/components/ui/theme';
import type { CatalogueParameter } from '@/server/contract/catalogue';
import { useBench } from './bench-context';
import { shownParameters } from './shown-parameters';

interface ParameterGridProps {
  parameters: readonly CatalogueParameter[];
  values: Readonly<Record<string, number | string>>;
  columns: 1 | 3;
  /** What the server said about a parameter. */
  errorOf: (parameter: string) => string | undefined;
  onChange: (parameter: string, value: number | string) => void;
  disabled?: boolean;
}

/** Rows of equal cells; a row that is not full keeps the width of its cells. */
export function ControlGrid({ columns, children }: { columns: 1 | 3; children: ReactNode[] }) {
  if (columns === 1) return <View style={{ gap: space(1) }}>{children}</View>;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', marginHorizontal: -16 }}>
      {children.map((child, i) => (
        <View key={i} style={{ width: '33.333%', paddingHorizontal: 16 }}>
          {child}
        </View>
      ))}
    </View>
  );
}

export function ParameterGrid({ parameters, values, columns, errorOf, onChange, disabled = false }: ParameterGridProps) {
  const { dispatch } = useBench();
  const letGo = (): void => dispatch({ kind: 'let-go' });
  return (
    <ControlGrid columns={columns}>
      {shownParameters(parameters, values).map((parameter) => {
        const value = values[parameter.id] ?? parameter.initial;
        if ('options' in parameter) {
          const rows = parameter.options.map(({ value: id, label }) => ({ id, label }));
          return (
            <Select
              key={parameter.id}
              label={parameter.label}
              rows={rows}
              value={String(value)}
              error={errorOf(parameter.id)}
              disabled={disabled}
              onChange={(next) => onChange(parameter.id, next)}
            />
          );
        }
        const { id, label, unit, min, max, step, initial, fromHeader } = parameter;
        return (
          <Slider
            key={id}
            {...{ label, unit, min, max, step, initial, disabled }}
            value={Number(value)}
            note={fromHeader && `started at ${fromHeader}`}
            error={errorOf(id)}
            onChange={(next) => onChange(id, next)}
            onLetGo={letGo}
          />
        );
      })}
    </ControlGrid>
  );
}
