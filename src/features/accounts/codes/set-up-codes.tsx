import { useEffect, useRef, useState } from 'react';
import type * as z from 'zod';
import { codeBody, startCodesBody } from '#shared/contracts/one-time-codes.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call, type CallAnswer } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { QrCode } from '#src/ui/qr/qr-code.tsx';
import { RecoveryCodes } from './recovery-codes.tsx';

type Secret = CallAnswer<typeof routes.startCodes>;

/** Password, then the secret for one's phone and its first code, then the recovery codes. */
export function SetUpCodes({
  onOn,
  onDone,
  onDrop,
}: {
  /** Codes are on; the recovery codes are being shown. */
  onOn?: () => void;
  onDone: () => void;
  /** Left out where there is no way round it. */
  onDrop?: () => void;
}) {
  const [secret, setSecret] = useState<Secret | null>(null);
  const [recovery, setRecovery] = useState<readonly string[] | null>(null);
  if (recovery) return <RecoveryCodes codes={recovery} onDone={onDone} />;
  return (
    <div className="max-w-[432px]">
      {secret ? (
        <DeviceStep
          secret={secret}
          onOn={(codes) => {
            setRecovery(codes);
            onOn?.();
          }}
        />
      ) : (
        <PasswordStep onSecret={setSecret} />
      )}
      {onDrop && (
        <Button look="plain" className="mt-3" onClick={onDrop}>
          Not now
        </Button>
      )}
    </div>
  );
}

function PasswordStep({ onSecret }: { onSecret: (secret: Secret) => void }) {
  const form = useZodForm(startCodesBody, { password: '' });
  return (
    <Form
      form={form}
      className="space-y-5"
      send={async (body) => onSecret(await call(routes.startCodes, { body }))}
    >
      <TextField
        name="password"
        type="password"
        label="Your password"
        hint="So that nobody else sets them up at your desk."
        autoComplete="current-password"
      />
      <Button
        type="submit"
        look="primary"
        busy={form.formState.isSubmitting}
        busyLabel="Preparing …"
      >
        Go on
      </Button>
    </Form>
  );
}

function DeviceStep({
  secret: { secret, uri },
  onOn,
}: {
  secret: Secret;
  onOn: (recoveryCodes: readonly string[]) => void;
}) {
  const form = useZodForm(codeBody, { code: '' });
  const title = useRef<HTMLHeadingElement>(null);
  useEffect(() => title.current?.focus(), []);
  const send = async (body: z.output<typeof codeBody>) =>
    onOn((await call(routes.confirmCodes, { body })).recoveryCodes);
  return (
    <div className="space-y-5">
      <h3 ref={title} tabIndex={-1} className="text-sub font-bold">
        On your phone
      </h3>
      <p>
        Point an app that makes one-time codes (an authenticator) at this picture. Reading this on
        the phone itself? <a href={uri}>Open the app</a>.
      </p>
      <QrCode text={uri} label="QR code with the secret of your one-time codes" />
      <p>
        Or type this into the app:
        <span className="mt-1 block select-all break-words font-bold tabular-nums">
          {(secret.match(/.{4}/g) ?? []).join(' ')}
        </span>
      </p>
      <Form form={form} className="space-y-5" send={send}>
        <TextField
          name="code"
          label="The code that the app shows"
          hint="Six digits. It changes every half minute."
          inputMode="numeric"
          autoComplete="one-time-code"
        />
        <Button
          type="submit"
          look="primary"
          busy={form.formState.isSubmitting}
          busyLabel="Turning on …"
        >
          Turn on one-time codes
        </Button>
      </Form>
    </div>
  );
}
