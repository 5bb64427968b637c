import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useWatch } from 'react-hook-form';
import type { ProtocolVersion } from '#shared/contracts/protocol.ts';
import { routes } from '#shared/contracts/routes.ts';
import { differences, FIGURE_GROUPS } from '#shared/protocol/figures.ts';
import { call } from '#src/api/client.ts';
import { protocolQuery } from '#src/api/protocol.queries.ts';
import { setUpsQuery } from '#src/api/visits.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { CheckboxField } from '#src/ui/form/choice-fields.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { NumberField } from '#src/ui/form/number-field.tsx';
import { SelectField, TextArea } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { Section } from '#src/ui/page.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { DifferenceList } from './difference-list.tsx';
import {
  fieldsOf,
  protocolForm,
  type ProtocolFields,
  unitOf,
  valuesOf,
} from './protocol-form-shape.ts';
import { Unstudied } from './unstudied.tsx';

const [GATES, ...OTHERS] = FIGURE_GROUPS;

/** The owner's form: every figure with what it does, what would change, and why. */
export function ProtocolForm({ current }: { current: ProtocolVersion }) {
  const client = useQueryClient();
  const say = useStatus();
  const setUps = useQuery(setUpsQuery).data?.items ?? [];
  const form = useZodForm(protocolForm, fieldsOf(current.values));
  const typed = useWatch({ control: form.control }) as ProtocolFields;
  const values = valuesOf(typed);
  const nameOf = (id: string) => setUps.find((each) => each.id === id)?.name ?? null;
  const changed = differences(current.values, values, nameOf);
  const send = async ({ note, ...given }: ProtocolFields) => {
    const answer = await call(routes.changeProtocol, {
      body: { after: current.version, values: valuesOf(given), note },
    });
    client.setQueryData(protocolQuery.queryKey, answer);
    say(`Protocol ${answer.current.version} holds from now on.`);
  };
  return (
    <Form form={form} send={send}>
      {[GATES, ...OTHERS].map(
        (group, n) =>
          group && (
            <Section key={group.title} title={group.title} first={n === 0} wide>
              <div className="grid gap-x-10 gap-y-6 tablet:grid-cols-2">
                {group.figures.map(({ key, label, does, source }) => (
                  <NumberField<ProtocolFields>
                    key={key}
                    name={key}
                    label={label}
                    unit={unitOf(key)}
                    hint={`${does} (${source})`}
                  />
                ))}
                {n === FIGURE_GROUPS.length - 1 && (
                  <>
                    <SelectField<ProtocolFields>
                      name="setUpId"
                      label="Set-up of a new visit"
                      hint="Its figures stand ready; a visit can take another."
                      options={[
                        { value: '', label: 'none: chosen in the visit' },
                        ...setUps.map(({ id, name }) => ({ value: id, label: name })),
                      ]}
                    />
                    <CheckboxField<ProtocolFields>
                      name="thighTurnsLittle"
                      label="The planted thigh turns little"
                      note="Assumed with a belt pointer alone, on sides that are called from now on. Each reading shows it, and it can be turned off there. (from our model, no source)"
                    />
                  </>
                )}
              </div>
              {n === 0 && <Unstudied rules={values} />}
            </Section>
          ),
      )}
      <Section
        title="What changes"
        margin={
          <p>
            A version is never changed afterwards. Readings keep the version they were made with
            until somebody reads them again.
          </p>
        }
      >
        {changed.length === 0 ? (
          <p className="text-soft">Nothing yet. Change a figure above.</p>
        ) : (
          <>
            <DifferenceList items={changed} />
            <div className="mt-4 max-w-lead">
              <TextArea<ProtocolFields>
                name="note"
                label="Why"
                hint="Everybody in the practice reads it beside the version."
              />
            </div>
            <div className="mt-5 flex flex-wrap gap-3">
              <Button
                type="submit"
                look="primary"
                busy={form.formState.isSubmitting}
                busyLabel="Saving…"
              >
                Make protocol {current.version + 1}
              </Button>
              <Button onClick={() => form.reset(fieldsOf(current.values))}>
                Put everything back
              </Button>
            </div>
          </>
        )}
      </Section>
    </Form>
  );
}
