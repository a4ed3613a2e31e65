export { NothingHere as default } from "@/components/site/NothingHere";
