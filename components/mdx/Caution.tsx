import type { ReactNode } from "react";
import { Cautions } from "@/components/ui/Cautions";
import { CAUTIONS } from "./cautions";

/** `<Caution about="height transmit">`: the standing texts of these topics, then what the module adds to them. */
export function Caution({ about = "", children }: { about?: string; children?: ReactNode }) {
  const topics = about.split(" ").filter((topic): topic is keyof typeof CAUTIONS => Object.hasOwn(CAUTIONS, topic));
  return (
    <div className="my-5">
      <Cautions items={topics.map((topic) => CAUTIONS[topic])} />
      {children && (
        <div className="flow-root border-line border-t-0 border-l-8 border-caution-deep bg-sheet px-3.5">
          {children}
        </div>
      )}
    </div>
  );
}
