"use client";
import { useRouter } from "next/navigation";
import { useActionState, useEffect } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { Working } from "@/components/ui/Working";

type WaitingOrderProps = {
  employer: string;
  orderId: string;
  amount: string;
  /** The person came back from the card page without paying. */
  left: boolean;
  pay: FormAction;
  cancel: FormAction;
};

const POLL_MS = 1500;

/** An order that is not paid yet: either the payment's confirmation is on its way, or it waits for a card. */
export function WaitingOrder({ employer, orderId, amount, left, pay, cancel }: WaitingOrderProps) {
  const router = useRouter();
  const [payResult, sendPay] = useActionState(pay, null);
  const [cancelResult, sendCancel] = useActionState(cancel, null);
  useEffect(() => {
    if (left) return;
    const timer = setInterval(() => router.refresh(), POLL_MS);
    return () => clearInterval(timer);
  }, [left, router]);
  const message = messageOf(payResult) ?? messageOf(cancelResult);
  const hidden = (
    <>
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="order" value={orderId} />
    </>
  );
  return (
    <>
      <h1 className="text-h1">{left ? "This order waits" : "Waiting for the payment"}</h1>
      <p className="mt-3 max-w-measure text-lead">
        {left
          ? "Nothing was charged. The order waits here; pay it, or cancel it to order the fees again."
          : "The card page reports a payment within seconds. This page changes by itself; you may close it."}
      </p>
      {!left && (
        <div className="mt-5 max-w-[480px]">
          <Working label="Waiting for the card page" />
        </div>
      )}
      {message && (
        <Notice tone="minus" fact={message} live className="mt-5">
          The order is as it was.
        </Notice>
      )}
      <div className="mt-6 flex flex-wrap gap-3">
        <form action={sendPay}>
          {hidden}
          <SubmitKey>{`Pay ${amount} by card`}</SubmitKey>
        </form>
        <form action={sendCancel}>
          {hidden}
          <SubmitKey variant="cut">Cancel the order</SubmitKey>
        </form>
      </div>
    </>
  );
}
