namespace NetFault;
internal static class Placeholder;
